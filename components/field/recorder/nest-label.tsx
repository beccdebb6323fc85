'use client';

import { useEffect, useState } from 'react';
import { nestTitle } from '@/components/field/nests/nest-lists';
import { useNest } from '@/lib/offline/hooks/use-nest';

/** What the recorder needs to know of its nest; it does not change while a comb is read. */
export interface NestLabel {
  title: string;
  code: string;
  name: string | null;
  taxon: string | null;
}

/** Before the nest's record is open, and when this phone does not hold it. */
const UNNAMED: NestLabel = { title: 'this nest', code: '', name: null, taxon: null };

interface NestLabelReaderProps {
  nest: string;
  onRead: (label: NestLabel) => void;
}

/** Reads the label and hands it up. It is unmounted then, so that no press makes the phone read the whole nest again. */
function NestLabelReader({ nest, onRead }: NestLabelReaderProps): null {
  const view = useNest(nest);
  useEffect(() => {
    if (view) onRead({ title: nestTitle(view), code: view.code, name: view.name, taxon: view.taxon });
  }, [view, onRead]);
  return null;
}

/** The label of a nest, read once. `reader` has to be drawn somewhere until it has done its work. */
export function useNestLabel(nest: string) {
  const [label, setLabel] = useState<NestLabel | null>(null);
  return { label: label ?? UNNAMED, reader: label ? null : <NestLabelReader nest={nest} onRead={setLabel} /> };
}
