import type { Metadata } from 'next';
import localFont from 'next/font/local';
import { headers } from 'next/headers';
import type { ReactNode } from 'react';
import './globals.css';

const ui = localFont({
  src: '../node_modules/@fontsource-variable/inter/files/inter-latin-wght-normal.woff2',
  weight: '100 900',
  variable: '--font-ui',
});

/** The letters of formulas (μ, Δ, σ, ω), which the first file lacks. */
const greek = localFont({
  src: '../node_modules/@fontsource-variable/inter/files/inter-greek-wght-normal.woff2',
  weight: '100 900',
  variable: '--font-greek',
  preload: false,
  adjustFontFallback: false,
});

export const metadata: Metadata = {
  title: { default: 'Retrodict', template: '%s · Retrodict' },
  description: 'Speeds and delta-V of two vehicles in a low-speed collision, with honest ranges.',
};

export default async function Layout({ children }: { children: ReactNode }) {
  // A page made ahead of time could not carry the nonce of its request, and every script in it would be blocked.
  await headers();
  return (
    <html lang="en" className={`${ui.variable} ${greek.variable}`}>
      <body>{children}</body>
    </html>
  );
}
