'use client';

import { useState } from 'react';
import { TurnOff } from './turn-off';
import { TurnOn } from './turn-on';

/** Turning on stays in view after it is done, since the recovery codes are shown there once. */
export function TwoFactorPanel({ on }: { on: boolean }) {
  const [wasOn] = useState(on);
  return wasOn ? <TurnOff /> : <TurnOn />;
}
