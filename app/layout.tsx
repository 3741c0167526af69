import type { Metadata } from 'next';
import { connection } from 'next/server';
import type { ReactNode } from 'react';
import './globals.css';

export const metadata: Metadata = {
  title: { default: 'Fairhand', template: '%s · Fairhand' },
  description:
    'Calculations in a fair hand: written out in full, checked, sealed, and answered line by line.',
};

export default async function Layout({ children }: { children: ReactNode }) {
  // A page written while building would carry no nonce, and its scripts would not run.
  await connection();
  return (
    <html lang="en">
      <body>{children}</body>
    </html>
  );
}
