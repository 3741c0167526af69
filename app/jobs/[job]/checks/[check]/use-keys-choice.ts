'use client';

import { useEffect, useState } from 'react';

const place = 'fairhand:single-keys';

/** Whether single keys act, as this person last chose in this browser; on until they choose otherwise (WCAG 2.2, 2.1.4). */
export function useKeysChoice(): [boolean, (on: boolean) => void] {
  const [on, setOn] = useState(true);
  useEffect(() => setOn(window.localStorage.getItem(place) !== 'off'), []);
  const choose = (next: boolean) => {
    window.localStorage.setItem(place, next ? 'on' : 'off');
    setOn(next);
  };
  return [on, choose];
}
