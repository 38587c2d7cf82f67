import './globals.css';

import type { Metadata, Viewport } from 'next';
import { cookies, headers } from 'next/headers';
import type { ReactNode } from 'react';

import { fontClassNames } from '@/app/_ui/fonts';
import { themeCookie, themeFromCookie } from '@/app/_ui/theme';

export const metadata: Metadata = {
  title: { default: 'Fascicle', template: '%s · Fascicle' },
  description: 'The live log of intraoperative peripheral nerve monitoring',
  icons: { icon: { url: '/icon.svg', type: 'image/svg+xml' } },
};

export const viewport: Viewport = { width: 'device-width', initialScale: 1, themeColor: '#0f0f13' };

/** The frame of every page. Reading the headers makes each page dynamic: a prepared page would carry no nonce. */
export default async function RootLayout({ children }: { readonly children: ReactNode }) {
  await headers();
  const theme = themeFromCookie((await cookies()).get(themeCookie)?.value);
  return (
    <html lang="en-GB" data-theme={theme} className={fontClassNames} suppressHydrationWarning>
      <body className="min-h-dvh font-sans text-base">{children}</body>
    </html>
  );
}
