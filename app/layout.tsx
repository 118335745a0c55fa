import type { Metadata, Viewport } from 'next';
import { cookies } from 'next/headers';
import type { ReactNode } from 'react';
import { LOCALE_COOKIE, localeOf } from '@/lib/text/locale';
import { fontVariables } from './fonts';
import './globals.css';
import { Providers } from './providers';

export const metadata: Metadata = {
  title: { default: 'Strikeoff', template: '%s · Strikeoff' },
  description:
    'Where what was ordered, what was delivered and what was billed meet, for concrete flatwork contractors.',
  robots: { index: false, follow: false },
};

export const viewport: Viewport = {
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#eceae3' },
    { media: '(prefers-color-scheme: dark)', color: '#0f141b' },
  ],
};

export default async function RootLayout({ children }: { children: ReactNode }) {
  const locale = localeOf((await cookies()).get(LOCALE_COOKIE)?.value);
  return (
    <html lang={locale} className={fontVariables}>
      <body>
        <Providers locale={locale}>{children}</Providers>
      </body>
    </html>
  );
}
