'use client';

import { type ReactElement, useEffect, useState } from 'react';
import { Notice } from '@/components/ui/notice';
import { isLow, readStorage, spaceWords } from './storage-space';

/** Before the walk to the nest rather than at it: too little room is left on this phone. */
export function LowSpace(): ReactElement | null {
  const [left, setLeft] = useState<number | null>(null);
  useEffect(() => {
    void readStorage().then((space) => setLeft(space.left));
  }, []);
  if (!isLow(left)) return null;
  return (
    <Notice tone="warn" title={spaceWords(left)}>
      <p>A press that finds no room is shown as not saved. Marks need little; pictures and other apps need most.</p>
    </Notice>
  );
}
