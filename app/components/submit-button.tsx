'use client';

import type { ReactNode } from 'react';
import { useFormStatus } from 'react-dom';

interface SubmitButtonProps {
  children: ReactNode;
  /** 'p' leads the form; 'seal' only seals. */
  tone?: 'p' | 'plain' | 'seal';
  small?: boolean;
}

/** Sends its form, once at a time. */
export function SubmitButton({ children, tone = 'p', small = false }: SubmitButtonProps) {
  const { pending } = useFormStatus();
  const names = ['btn', tone === 'plain' ? '' : tone, small ? 's' : '', pending ? 'wait' : ''];
  return (
    <button type="submit" className={names.filter(Boolean).join(' ')} disabled={pending}>
      {children}
    </button>
  );
}
