'use client';

import { type KeyboardEvent, type ReactElement, useState } from 'react';
import { CombDiagram } from '@/components/comb/comb-diagram';
import { CombKey } from '@/components/comb/comb-key';
import type { CombCellView } from '@/components/comb/comb-view';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/ui/section';
import { type Axial, cellKey } from '@/lib/comb/axial';
import { CELL_STATES, type CellState, STATE_LETTERS } from '@/lib/comb/states';
import { type Correction, withCorrection, withoutCorrection } from './correction';
import { CorrectionForm } from './correction-form';
import { CorrectionList } from './correction-list';
import { LockActs } from './lock-acts';
import { useChange } from './use-change';
import { useLeaveGuard } from './use-leave-guard';

interface BenchProps {
  nest: string;
  reading: string;
  label: string;
  cells: readonly CombCellView[];
  cellSize: number;
  lockedVersion: number | null;
}

/** The cells with the decisions of the list drawn in, so that the comb shows what will be. */
function withList(cells: readonly CombCellView[], corrections: readonly Correction[]): CombCellView[] {
  const byKey = new Map(corrections.map((correction) => [cellKey(correction), correction]));
  return cells.map((cell) => {
    const correction = byKey.get(cellKey(cell));
    return correction ? { ...cell, state: correction.state, changed: true } : cell;
  });
}

const stateOfLetter = (letter: string): CellState | null =>
  CELL_STATES.find((state) => STATE_LETTERS[state] === letter.toLowerCase()) ?? null;

/** What the reviewer has picked: a cell, and the state typed on it. */
interface Pick {
  cell: Axial;
  lettered: CellState | null;
}

/** The reviewer's bench: pick a cell, say what it is and why, store the list; then lock, or amend what is locked. */
export function Bench({ nest, reading, label, cells, cellSize, lockedVersion }: BenchProps): ReactElement {
  const [pick, setPick] = useState<Pick | null>(null);
  const [corrections, setCorrections] = useState<Correction[]>([]);
  const { send, isSending, trouble } = useChange({ nest, reading, onStored: () => setCorrections([]) });
  useLeaveGuard(corrections.length > 0);
  const isLocked = lockedVersion !== null;
  const choose = (cell: Axial): void => setPick({ cell, lettered: null });
  const type = (event: KeyboardEvent): void => {
    const lettered = event.ctrlKey || event.metaKey || event.altKey ? null : stateOfLetter(event.key);
    if (pick && lettered && event.target instanceof SVGElement) setPick({ ...pick, lettered });
  };
  const save = (): void =>
    send({ act: 'settle', body: { cells: corrections.map(({ q, r, state, reason }) => ({ q, r, state, reason })) } });
  const picked = pick && cells.find((cell) => cellKey(cell) === cellKey(pick.cell));
  return (
    <div className="grid gap-8 lg:grid-cols-[minmax(0,30rem)_minmax(0,1fr)]">
      <div>
        <div className="overflow-x-auto print:overflow-visible" onKeyDown={type}>
          <CombDiagram
            cells={withList(cells, corrections)}
            label={label}
            cellSize={cellSize}
            current={pick?.cell ?? null}
            onCellPress={choose}
            onCellReach={choose}
          />
        </div>
        <CombKey className="mt-3" />
      </div>
      <div className="flex flex-col gap-8">
        <Section id="settle" title="Settle a cell">
          {isLocked ? (
            <p>Version {lockedVersion} is locked. Amend it to change a cell; the locked version is kept.</p>
          ) : pick && picked ? (
            <CorrectionForm
              key={`${cellKey(picked)} ${pick.lettered ?? ''}`}
              cell={picked}
              listed={corrections.find((correction) => cellKey(correction) === cellKey(picked)) ?? null}
              lettered={pick.lettered}
              onAdd={(correction) => setCorrections(withCorrection(corrections, correction))}
            />
          ) : (
            <p className="text-quiet">
              Press a cell, or reach it with Tab and the arrow keys. A letter then chooses its state: {letterWords()}.
            </p>
          )}
        </Section>
        {!isLocked && (
          <Section id="list" title="To be settled">
            {trouble && (
              <Notice tone="stop" live="assertive" className="mb-3">
                <p>{trouble}</p>
              </Notice>
            )}
            <CorrectionList
              corrections={corrections}
              isSending={isSending}
              onRemove={(correction) => setCorrections(withoutCorrection(corrections, correction))}
              onSave={save}
            />
          </Section>
        )}
        <Section id="lock" title={isLocked ? 'Amend' : 'Lock'}>
          <LockActs nest={nest} reading={reading} lockedVersion={lockedVersion} unsaved={corrections.length} />
        </Section>
      </div>
    </div>
  );
}

/** The letters of the states, as on the paper sheet: `- empty, o egg, …`. */
function letterWords(): string {
  return CELL_STATES.map((state) => `${STATE_LETTERS[state]} ${state}`).join(', ');
}
