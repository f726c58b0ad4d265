import '@fontsource/b612/latin-400.css';
import '@fontsource/b612/latin-700.css';
import './theme/tokens.css';
import './theme/base.css';
import type { Metadata, Viewport } from 'next';
import type { ReactNode } from 'react';
import { themeScript } from './prefs/themeScript';
import { Preferences } from './prefs/Preferences';
import { bandStyleSheet } from './theme/bands';
import { words } from './words';

export const metadata: Metadata = { title: words.product, robots: { index: false, follow: false } };
export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  themeColor: [
    { media: '(prefers-color-scheme: dark)', color: '#0d1218' },
    { media: '(prefers-color-scheme: light)', color: '#f6f4ef' },
  ],
};

export default function RootLayout({ children }: { children: ReactNode }) {
  return (
    // The script sets the theme before the first paint, so the attribute differs from what the server wrote.
    <html lang="en" data-theme="night" suppressHydrationWarning>
      <head>
        <style dangerouslySetInnerHTML={{ __html: bandStyleSheet() }} />
        <script dangerouslySetInnerHTML={{ __html: themeScript }} />
      </head>
      <body>
        <Preferences />
        {children}
      </body>
    </html>
  );
}
