import type { Metadata, Viewport } from 'next';
import { cookies } from 'next/headers';
import type { ReactNode } from 'react';
import { readTheme, THEME_COOKIE } from '@/components/ui/theme';
import { fontVariables } from './fonts';
import './globals.css';

export const metadata: Metadata = {
  title: { template: '%s · Assize', default: 'Assize' },
  description: 'Proficiency rounds and method comparison for grain, feed and food safety testing.',
  icons: { icon: '/favicon.svg' },
  robots: { index: false },
};

export const viewport: Viewport = {
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#faf6ee' },
    { media: '(prefers-color-scheme: dark)', color: '#1a1814' },
  ],
};

export default async function RootLayout({ children }: { children: ReactNode }) {
  const theme = readTheme((await cookies()).get(THEME_COOKIE)?.value);
  return (
    <html lang="en-GB" data-theme={theme === 'system' ? undefined : theme} className={fontVariables}>
      <body className="flex min-h-svh flex-col">{children}</body>
    </html>
  );
}
