import type { Metadata, Viewport } from 'next';
import type { ReactNode } from 'react';
import { fontVariables } from './fonts';
import './globals.css';
import { Providers } from '@/components/shell/providers';
import { ThemeScript } from '@/components/ui/theme-script';

export const metadata: Metadata = {
  title: { default: 'Moiety', template: '%s · Moiety' },
  description:
    'Joint breeding projects: who owns what part, what a pairing can give, and who gets which cent.',
  robots: { index: false },
};

export const viewport: Viewport = { width: 'device-width', initialScale: 1 };

export default function RootLayout({ children }: { children: ReactNode }) {
  return (
    <html lang="en" className={fontVariables} suppressHydrationWarning>
      <head>
        <ThemeScript />
      </head>
      <body>
        <Providers>{children}</Providers>
      </body>
    </html>
  );
}
