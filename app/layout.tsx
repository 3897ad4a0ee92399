import type { Metadata } from 'next';
import localFont from 'next/font/local';
import type { ReactNode } from 'react';
import './globals.css';

const ui = localFont({
  src: '../node_modules/@fontsource-variable/inter/files/inter-latin-wght-normal.woff2',
  weight: '100 900',
  variable: '--font-ui',
});

export const metadata: Metadata = {
  title: { default: 'Retrodict', template: '%s · Retrodict' },
  description: 'Speeds and delta-V of two vehicles in a low-speed collision, with honest ranges.',
};

export default function Layout({ children }: { children: ReactNode }) {
  return (
    <html lang="en" className={ui.variable}>
      <body>{children}</body>
    </html>
  );
}
