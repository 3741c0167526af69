import type { Metadata } from 'next';
import type { ReactNode } from 'react';
import './globals.css';

export const metadata: Metadata = {
  title: { default: 'Fairhand', template: '%s · Fairhand' },
  description:
    'Calculations in a fair hand: written out in full, checked, sealed, and answered line by line.',
};

export default function Layout({ children }: { children: ReactNode }) {
  return (
    <html lang="en">
      <body>{children}</body>
    </html>
  );
}
