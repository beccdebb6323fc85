'use client';

import type { ReactElement } from 'react';
import { countWords } from '@/components/ui/date-words';
import { Disclosure } from '@/components/ui/disclosure';
import { DateRangeWords } from '@/components/ui/date-range';
import { DescriptionList } from '@/components/ui/description-list';
import { Part } from '@/components/field/parts/part';
import { usePerson } from '@/components/field/parts/person-context';
import type { BroodEstimate, DateRange } from '@/lib/brood/answer';
import type { Mark } from '@/lib/comb/mark';
import { cellNumber } from '@/lib/comb/walk';
import { NO_ESTIMATE_WORDS } from './no-estimate-words';
import { SEASON_WORDS } from './season-words';
import { usePreview } from './use-preview';

interface BroodPreviewProps {
  nest: string;
  reading: string;
  taxon: string | null;
  marks: readonly Mark[];
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
  const { nest, assumptions, flags, readings, model, settings } = estimate;
  return (
    <>
      <p>
        <strong>Estimate</strong> from {countWords(readings.length, 'reading')} on this phone: the ranges hold in 8 of
        10 nests if the assumptions do.
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
          <li>
            Model {model.name} {model.version}, settings version {settings.version}: the product’s own defaults, because
            the team’s settings are at the office.
          </li>
        </ul>
      </Disclosure>
    </>
  );
}

/** A first estimate of the brood's dates, made on the phone from the readings it holds. The office has all of them. */
export function BroodPreview(props: BroodPreviewProps): ReactElement | null {
  const { zone } = usePerson();
  const preview = usePreview({ ...props, zone });
  if (props.marks.length === 0) return null;
  return (
    <Part title="Brood">
      {preview.kind === 'computing' && <p role="status">Estimate: computing …</p>}
      {preview.kind === 'none' && (
        <p role="status">{NO_ESTIMATE_WORDS[preview.reason]} Your marks are not touched by that.</p>
      )}
      {preview.kind === 'ready' && <EstimateWords estimate={preview.estimate} />}
    </Part>
  );
}
