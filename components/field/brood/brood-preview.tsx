'use client';

import { type ReactElement, useEffect, useState } from 'react';
import { Disclosure } from '@/components/ui/disclosure';
import { DateRangeWords } from '@/components/ui/date-range';
import { DescriptionList } from '@/components/ui/description-list';
import { Part } from '@/components/field/parts/part';
import { usePerson } from '@/components/field/parts/person-context';
import type { BroodEstimate, DateRange } from '@/lib/brood/answer';
import { estimateNest } from '@/lib/brood/estimate-nest';
import type { Mark } from '@/lib/comb/mark';
import { cellNumber } from '@/lib/comb/walk';
import { SEASON_WORDS } from './season-words';

interface BroodPreviewProps {
  nest: string;
  reading: string;
  taxon: string | null;
  marks: readonly Mark[];
}

/** `failed`: this reading could not be computed with; the reading itself is not touched by that. */
type Preview = { kind: 'computing' } | { kind: 'failed' } | { kind: 'ready'; estimate: BroodEstimate };

/** The latest moment a mark was made; the estimate looks no further. */
function readAt(marks: readonly Mark[]): number {
  return Math.max(...marks.map((mark) => Date.parse(mark.at)));
}

/** Computes after the screen has been drawn, so that nobody waits for it; no key is pressed on this screen. */
function usePreview({ nest, reading, taxon, marks }: BroodPreviewProps, zone: string): Preview {
  const [preview, setPreview] = useState<Preview>({ kind: 'computing' });
  const digest = marks.map((mark) => mark.opId).join();
  useEffect(() => {
    const work = setTimeout(() => {
      try {
        const at = readAt(marks);
        const estimate = estimateNest({
          nest,
          zone,
          asOf: at,
          taxon,
          readings: [{ id: reading, at, marks: [...marks] }],
        });
        setPreview({ kind: 'ready', estimate });
      } catch {
        setPreview({ kind: 'failed' });
      }
    });
    return () => clearTimeout(work);
    // The marks are one list by value: `digest` says when they change.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [nest, reading, taxon, zone, digest]);
  return preview;
}

function Range({ range, none }: { range: DateRange | null; none: string }): ReactElement {
  return range ? <DateRangeWords median={range.median} ends={range.p80} /> : <span>{none}</span>;
}

/** Why no first adult is given: it is past, or there is nothing to date. */
function noFirstAdult(flags: BroodEstimate['flags']): string {
  return flags.some(({ code }) => code === 'past')
    ? 'Past: adults have come out already.'
    : 'Cannot be dated from this reading.';
}

function EstimateWords({ estimate }: { estimate: BroodEstimate }): ReactElement {
  const { nest, assumptions, flags } = estimate;
  return (
    <>
      <p>
        <strong>Estimate:</strong> the ranges hold in 8 of 10 nests if the assumptions do.
      </p>
      <DescriptionList
        items={[
          { term: 'Nest founded', children: <Range range={nest.founded} none="Cannot be dated from this reading." /> },
          { term: 'First adult expected', children: <Range range={nest.firstEmergence} none={noFirstAdult(flags)} /> },
          { term: 'Season for moving', children: SEASON_WORDS[nest.season] },
        ]}
      />
      {flags.length > 0 && (
        <ul className="ml-5 list-disc">
          {flags.map(({ code, cell, text }) => (
            <li key={`${code} ${cell ? cellNumber(cell) : ''}`}>
              {cell && <strong>Cell {cellNumber(cell)}: </strong>}
              {text}
            </li>
          ))}
        </ul>
      )}
      <Disclosure size="field" summary="Assumptions">
        <ul className="ml-5 list-disc">
          {assumptions.map((text) => (
            <li key={text}>{text}</li>
          ))}
        </ul>
      </Disclosure>
    </>
  );
}

/** A first estimate of the brood's dates, made on the phone from this reading alone. The office computes with all of them. */
export function BroodPreview(props: BroodPreviewProps): ReactElement | null {
  const preview = usePreview(props, usePerson().zone);
  if (props.marks.length === 0) return null;
  return (
    <Part title="Brood">
      {preview.kind === 'computing' && <p role="status">Estimate: computing …</p>}
      {preview.kind === 'failed' && <p role="status">No estimate could be made from this reading.</p>}
      {preview.kind === 'ready' && <EstimateWords estimate={preview.estimate} />}
    </Part>
  );
}
