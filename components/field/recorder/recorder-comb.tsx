'use client';

import type { ReactElement } from 'react';
import { CombDiagram } from '@/components/comb/comb-diagram';
import type { Axial } from '@/lib/comb/axial';
import { combPart } from './comb-part';
import { type Desk, pressPlace } from './desk';
import { NotSavedAlert } from './not-saved-alert';
import { useFollowedWindow } from './use-followed-window';

interface RecorderCombProps {
  desk: Desk;
  title: string;
  /** Show the whole comb instead of a window around the current cell. */
  whole: boolean;
  /** The cell the person last worked on: the window follows it. */
  looking: Axial | null;
  onPress: (place: Axial) => void;
}

/** The labels of the frame lie over the corners of the picture: on a phone every row of pixels is a row of cells. */
const LABELS =
  'h-full [&>.comb-label]:text-field [&>.comb-label]:absolute [&>.comb-label]:z-1 [&>.comb-label]:bg-paper/85 [&>.comb-label]:px-1 ' +
  '[&>.comb-label:first-child]:top-0 [&>.comb-label:first-child]:left-0 ' +
  '[&>.comb-label:last-child]:bottom-0 [&>.comb-label:last-child]:left-0';

/** A cell whose press is not known to be kept has a dashed wall, as bold as any other. */
const PENDING = '[&_[data-pending]]:opacity-100 [&_[data-pending]>use:first-child]:[stroke-dasharray:3.5_3]';

/** From this many cells on, the whole comb on a phone is too small for the corner marks. */
const SMALL_FROM = 150;

/** The comb above the keys: it shows where the person is, and can be pressed to go elsewhere. */
export function RecorderComb({ desk, title, whole, looking, onPress }: RecorderCombProps): ReactElement {
  const { view } = desk.recorder;
  const window = useFollowedWindow(looking);
  const { cells, ghosts } = combPart(view, whole ? null : window, desk.expected);
  const press = (place: Axial): void => {
    pressPlace(desk, place);
    onPress(place);
  };
  return (
    <div className="relative min-h-36 flex-1 has-[[role=alert]]:min-h-56 max-[359px]:has-[[role=alert]]:min-h-72 lg:min-h-0">
      <div className="absolute inset-0">
        <CombDiagram
          cells={cells}
          ghosts={ghosts}
          label={`Comb of ${title}, ${view.tally.cellsTotal} cells marked`}
          current={view.current}
          onCellPress={press}
          onCellReach={(place) => desk.recorder.jump(place)}
          viewWindow={whole ? undefined : window}
          cellSize={whole && cells.length >= SMALL_FROM ? 16 : 44}
          sizing="fill"
          className={`${LABELS} ${PENDING}`}
        />
      </div>
      <div className="absolute inset-x-0 top-1 z-2 max-h-full overflow-y-auto">
        <NotSavedAlert recorder={desk.recorder} />
      </div>
    </div>
  );
}
