import '@fontsource-variable/newsreader/opsz.css';
import '@fontsource-variable/public-sans/wght.css';
import '@fontsource/ibm-plex-mono/400.css';
import '@fontsource/ibm-plex-mono/500.css';
import './globals.css';

import { type Metadata, type Viewport } from 'next';
import { headers } from 'next/headers';
import { type ReactNode } from 'react';

import { schemeScript } from '@/components/frame/scheme-script';
import { ToastProvider } from '@/components/ui/toast';

export const metadata: Metadata = { title: { default: 'Heddle', template: '%s · Heddle' }, description: 'A checked citation network from bibliography exports' };
export const viewport: Viewport = { width: 'device-width', initialScale: 1, themeColor: [{ media: '(prefers-color-scheme: light)', color: '#f7f3ea' }, { media: '(prefers-color-scheme: dark)', color: '#181a1e' }] };

export default async function RootLayout({ children }: { children: ReactNode }) {
  const nonce = (await headers()).get('x-nonce') ?? undefined;
  return (
    <html lang="en" suppressHydrationWarning>
      <head>
        <script nonce={nonce} suppressHydrationWarning dangerouslySetInnerHTML={{ __html: schemeScript }} />
      </head>
      <body>
        <a href="#main" className="no-print absolute top-2 left-2 z-50 -translate-y-20 rounded-sm border border-indigo bg-paper px-3 py-2 font-semibold focus:translate-y-0">
          Skip to content
        </a>
        <ToastProvider>{children}</ToastProvider>
      </body>
    </html>
  );
}
