import type { Metadata } from 'next';
import type { ReactNode } from 'react';

export const metadata: Metadata = {
  title: { absolute: 'Undereave' },
  description: 'Paper-wasp nests read cell by cell, with or without signal.',
};

/** The field side draws its own frame on the phone; nothing of the lab side comes with it. */
export default function FieldLayout({ children }: { children: ReactNode }): ReactNode {
  return children;
}
