'use client';

import { type ReactElement, type ReactNode, useState } from 'react';
import { FieldButton } from '@/components/field/parts/field-button';
import { CountField } from '@/components/field/parts/count-field';
import { Sheet } from '@/components/field/parts/sheet';
import type { Desk } from './desk';

interface ToolsSheetProps {
  desk: Desk;
  open: boolean;
  onClose: () => void;
  whole: boolean;
  onWhole: (whole: boolean) => void;
  /** A further tool. */
  children?: ReactNode;
}

/** Changes the number of cells counted, while the walk goes on. */
function CountTool({ desk, onClose }: Pick<ToolsSheetProps, 'desk' | 'onClose'>): ReactElement {
  const [counted, setCounted] = useState(desk.recorder.view.expectedTotal);
  const keep = (): void => {
    desk.recorder.expect(counted);
    onClose();
  };
  return (
    <div className="flex flex-col gap-gap">
      <CountField value={counted} onChange={setCounted} />
      <FieldButton onClick={keep}>Use this number</FieldButton>
    </div>
  );
}

/** What is needed now and then while reading: painting, the whole comb, the number of cells. */
export function ToolsSheet({ desk, open, onClose, whole, onWhole, children }: ToolsSheetProps): ReactElement {
  const painting = desk.mode.kind === 'paint';
  const paint = (): void => {
    desk.setMode(painting ? { kind: 'walk' } : { kind: 'paint', state: 'egg' });
    onClose();
  };
  const look = (): void => {
    onWhole(!whole);
    onClose();
  };
  return (
    <Sheet open={open} title="Tools" onClose={onClose}>
      <div className="flex flex-col gap-6">
        <div className="grid gap-gap sm:grid-cols-2">
          <FieldButton onClick={paint}>{painting ? 'Stop painting' : 'Paint cells'}</FieldButton>
          <FieldButton onClick={look}>{whole ? 'Show the cells close by' : 'Show the whole comb'}</FieldButton>
          {children}
        </div>
        <CountTool desk={desk} onClose={onClose} />
      </div>
    </Sheet>
  );
}
