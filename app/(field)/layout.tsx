import type { Metadata, Viewport } from 'next';
import type { ReactNode } from 'react';

export const metadata: Metadata = { title: 'Undereave', description: 'Paper-wasp nests read cell by cell, with or without signal.' };

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  viewportFit: 'cover',
  themeColor: '#ffffff',
};

/** The field side has a frame of its own, drawn on the phone; nothing of the lab side is loaded. */
export default function FieldLayout({ children }: { children: ReactNode }): ReactNode {
  return children;
}
