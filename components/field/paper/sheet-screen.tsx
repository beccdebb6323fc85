'use client';

import type { ReactElement } from 'react';
import { FieldFrame } from '@/components/field/frame/field-frame';
import { useHand } from '@/components/field/hand/use-hand';
import { FieldButton } from '@/components/field/parts/field-button';
import { Screen } from '@/components/field/parts/screen';
import { fieldHref } from '@/components/field/routing/field-route';
import { useNest } from '@/lib/offline/hooks/use-nest';
import { sheetCode } from '@/lib/kit/sheet-code';
import { PaperSheet } from './paper-sheet';

interface SheetFrameProps {
  back: { href: string; to: string };
  code: string | null;
  nest: string | null;
}

function SheetFrame({ back, code, nest }: SheetFrameProps): ReactElement {
  const { lamp } = useHand();
  return (
    <FieldFrame back={back} help="sheet">
      <Screen title="Paper field sheet" wide>
        <div className="print-hidden flex flex-col gap-gap">
          <p>
            One page for a day without a phone, on A4 or Letter. What is written on it can be typed in afterwards, with
            the same letters, at the visit.
          </p>
          {lamp && <p>By low lamp the white sheet is not shown here. It prints all the same.</p>}
          <FieldButton tone="main" onClick={() => window.print()}>
            Print
          </FieldButton>
        </div>
        <div className="overflow-x-auto print:overflow-visible" tabIndex={0} role="group" aria-label="The sheet">
          <PaperSheet code={code} nest={nest} />
        </div>
      </Screen>
    </FieldFrame>
  );
}

/** The sheet of one nest. Its code can be printed before the nest has come to this phone. */
export function SheetScreen({ id }: { id: string }): ReactElement {
  const nest = useNest(id);
  const back = { href: fieldHref({ kind: 'nest', id }), to: 'the nest' };
  return <SheetFrame back={back} code={sheetCode(id)} nest={nest?.code ?? null} />;
}

/** A sheet for a nest that is not in the app yet. */
export function BlankSheetScreen(): ReactElement {
  return <SheetFrame back={{ href: fieldHref({ kind: 'nests' }), to: 'the nests' }} code={null} nest={null} />;
}
