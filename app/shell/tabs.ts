export const TABS = ['board', 'forecasts', 'layers', 'log', 'settings'] as const;
export type Tab = (typeof TABS)[number];

export const isTab = (segment: string): segment is Tab => (TABS as readonly string[]).includes(segment);
export const tabPath = (eventId: string, tab: Tab): string => `/events/${encodeURIComponent(eventId)}${tab === 'board' ? '' : `/${tab}`}`;
