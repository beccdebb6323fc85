import type { Metadata } from 'next';
import type { ReactElement, ReactNode } from 'react';
import { HAND_SCRIPT } from '@/components/field/hand/hand-settings';

export const metadata: Metadata = {
  title: { absolute: 'Undereave' },
  description: 'Paper-wasp nests read cell by cell, with or without signal.',
};

/** The field side draws its own frame on the phone; nothing of the lab side comes with it. */
export default function FieldLayout({ children }: { children: ReactNode }): ReactElement {
  return (
    <>
      <script>{HAND_SCRIPT}</script>
      {children}
    </>
  );
}
