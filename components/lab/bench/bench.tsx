'use client';

import type { ReactElement } from 'react';
import type { CombCellView } from '@/components/comb/comb-view';
import { Section } from '@/components/ui/section';
import { BenchComb } from './bench-comb';
import { LockActs } from './lock-acts';
import { SettleSection } from './settle-section';
import { useChange } from './use-change';
import { useDesk } from './use-desk';
import { useLeaveGuard } from './use-leave-guard';

interface BenchProps {
  nest: string;
  reading: string;
  label: string;
  cells: readonly CombCellView[];
  cellSize: number;
  /** The version that is locked now; null while the reading can be settled. */
  lockedVersion: number | null;
}

/** The reviewer's bench: pick a cell, say what it is and why, store the list; then lock, or amend what is locked. */
export function Bench({ nest, reading, label, cells, cellSize, lockedVersion }: BenchProps): ReactElement {
  const desk = useDesk(cells);
  const { send, isSending, trouble } = useChange({ nest, reading, onStored: desk.clear });
  useLeaveGuard(desk.corrections.length > 0);
  const save = (): void => {
    const decided = desk.corrections.map(({ q, r, state, reason }) => ({ q, r, state, reason }));
    send({ act: 'settle', body: { cells: decided } });
  };
  return (
    <div className="grid gap-8 lg:grid-cols-[minmax(0,30rem)_minmax(0,1fr)]">
      <BenchComb label={label} cells={cells} cellSize={cellSize} {...desk} />
      <div className="flex flex-col gap-8">
        {lockedVersion === null ? (
          <SettleSection desk={desk} isSending={isSending} trouble={trouble} onSave={save} />
        ) : (
          <p>Version {lockedVersion} is locked. Amend it to change a cell; the locked version is kept.</p>
        )}
        <Section id="lock" title={lockedVersion === null ? 'Lock' : 'Amend'}>
          <LockActs
            nest={nest}
            reading={reading}
            lockedVersion={lockedVersion}
            unsaved={lockedVersion === null ? desk.corrections.length : 0}
          />
        </Section>
      </div>
    </div>
  );
}
