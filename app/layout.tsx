import type { Metadata, Viewport } from 'next';
import { headers } from 'next/headers';
import type { ReactNode } from 'react';
import '@fontsource/libertinus-serif/400.css';
import '@fontsource/libertinus-serif/400-italic.css';
import '@fontsource/libertinus-serif/600.css';
import '@fontsource-variable/commissioner/flar.css';
import 'katex/dist/katex-swap.min.css';
import './globals.css';
import { KeysProvider } from './_components/keys/keys-provider';
import { RunningHead } from './_components/shell/running-head';
import { whoIsHere } from './_components/shell/who-is-here';
import { themeScript } from './_components/theme/theme-script';

export const metadata: Metadata = {
  title: { default: 'A bench for Milnor–Witt K-theory · Quadrel', template: '%s · Quadrel' },
  description:
    'Quadrel reads words of Milnor–Witt K-theory as they are typed in TeX, brings them to canonical form, and decides equality with evidence that a referee can recheck.',
  icons: { icon: { url: '/favicon.svg', type: 'image/svg+xml' } },
};

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#c9ccc5' },
    { media: '(prefers-color-scheme: dark)', color: '#121517' },
  ],
};

/** The shell: theme before the first paint, skip link, running head, keys. A page brings its slab, its sheet and its colophon. */
export default async function Layout({ children }: { children: ReactNode }) {
  const nonce = (await headers()).get('x-nonce') ?? undefined;
  const who = await whoIsHere();
  return (
    <html lang="en" suppressHydrationWarning>
      <head>
        {/* Browsers hide the nonce from scripts, so React would see a difference that is none. */}
        <script nonce={nonce} suppressHydrationWarning dangerouslySetInnerHTML={{ __html: themeScript }} />
      </head>
      <body>
        <KeysProvider who={who}>
          <a className="skip" href="#sheet">
            Skip to the sheet
          </a>
          <RunningHead who={who} />
          {children}
        </KeysProvider>
      </body>
    </html>
  );
}
