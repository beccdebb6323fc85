'use client';

import { type ReactElement, useState } from 'react';
import { CellGlyph } from '@/components/comb/cell-glyph';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { momentWords } from '@/components/ui/date-words';
import { cellKey } from '@/lib/comb/axial';
import { STATE_WORDS } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';
import type { PairRow, SeenView, SettledCellView } from './review-shapes';
import { daysWords, PICK_WORDS, seenWords } from './review-words';
import { SettleForm } from './settle-form';

interface SettleListProps {
  reading: string;
  /** The cells that were, or have to be, decided. */
  pairs: readonly PairRow[];
  /** Days between the laying dates of both readings, by cell key. */
  apart: Readonly<Record<string, number>>;
  /** May the person settle now? */
  settles: boolean;
  seen: number;
  zone: string;
  year: string;
}

function Saw({ who, seen }: { who: string; seen: SeenView | null }): ReactElement {
  return (
    <span className="inline-flex items-center gap-1.5">
      {seen && <CellGlyph state={seen.state} size={26} />}
      <span>
        <span className="text-quiet">{who} </span>
        {seenWords(seen)}
      </span>
    </span>
  );
}

function settledWords({ pick, state }: SettledCellView): string {
  if (pick === 'none' || pick === 'unsure') return PICK_WORDS[pick];
  return pick ? `${STATE_WORDS[state]} (${PICK_WORDS[pick]})` : STATE_WORDS[state];
}

function Decision({ settled, zone, year }: { settled: SettledCellView; zone: string; year: string }): ReactElement {
  return (
    <p className="mt-1 border-l-4 border-main pl-2">
      <span className="font-bold">Settled: {settledWords(settled)}.</span>{' '}
      <span className="[overflow-wrap:anywhere] whitespace-pre-line">{settled.reason}</span>{' '}
      <span className="text-sm text-quiet">
        {settled.actor}, {momentWords(settled.at, zone, year)}
      </span>
    </p>
  );
}

function CellItem({ pair, ...list }: Omit<SettleListProps, 'pairs'> & { pair: PairRow }): ReactElement {
  const [again, setAgain] = useState(false);
  const [refused, setRefused] = useState<string | null>(null);
  const { settled } = pair;
  const days = list.apart[cellKey(pair)];
  const asks = list.settles && (settled === null || again);
  return (
    <li className="keep-together border-b border-rule py-2">
      <p className="flex flex-wrap items-center gap-x-5 gap-y-1">
        <span className="min-w-16 font-bold">Cell {cellNumber(pair)}</span>
        <Saw who="field" seen={pair.field} />
        <Saw who="lab" seen={pair.lab} />
        {pair.clash && <span className="font-bold text-stop">clash</span>}
        {days !== undefined && days !== 0 && (
          <span className="text-sm text-quiet">laying dates {daysWords(Math.abs(days))} apart</span>
        )}
      </p>
      {refused && (
        <Notice tone="stop" live="assertive" className="mt-1">
          <p>{refused}</p>
        </Notice>
      )}
      {settled && <Decision settled={settled} zone={list.zone} year={list.year} />}
      {!settled && !list.settles && <p className="text-quiet">not settled yet</p>}
      {list.settles && settled && !again && (
        <Button tone="quiet" className="print-hidden" onClick={() => setAgain(true)}>
          Settle cell {cellNumber(pair)} again
        </Button>
      )}
      {asks && (
        <SettleForm
          reading={list.reading}
          pair={pair}
          seen={list.seen}
          onDone={() => {
            setAgain(false);
            setRefused(null);
          }}
          onRefused={setRefused}
        />
      )}
    </li>
  );
}

/** Every cell the readers do not see alike, each to be decided by itself. */
export function SettleList({ pairs, ...list }: SettleListProps): ReactElement {
  if (pairs.length === 0) return <p>Both readers see every cell alike: nothing is to be settled.</p>;
  return (
    <ol aria-label="Cells to settle" className="list-none">
      {pairs.map((pair) => (
        <CellItem key={cellKey(pair)} pair={pair} {...list} />
      ))}
    </ol>
  );
}
