import type { ReactNode } from 'react';
import { EventShell } from '../../shell/EventShell';

export default async function EventLayout({ children, params }: { children: ReactNode; params: Promise<{ eventId: string }> }) {
  const { eventId } = await params;
  return <EventShell eventId={decodeURIComponent(eventId)}>{children}</EventShell>;
}
