import 'server-only';
import type { BroodReading } from '@/lib/brood/input';
import { type BroodSpan, type StageLook, type StageSeen, broodSpans } from '@/lib/brood/learning/brood-spans';
import { type DevelopmentClock, developmentClock } from '@/lib/brood/temperature/development-clock';
import { developmentDays } from '@/lib/brood/temperature/development-days';
import type { TemperatureSettings } from '@/lib/brood/temperature/temperature-settings';
import { cellKey } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import { groupBy } from '@/lib/kit/group-by';
import { broodInput } from '@/lib/server/queries/brood';
import type { NestRow } from '@/lib/server/queries/nest-rows';
import type { TeamScope } from '@/lib/server/queries/team-scope';

/** What a state says about the stage; null where it says nothing, and the brood is not followed across it. */
const SEEN: Readonly<Record<CellState, StageSeen | null>> = {
  ...{ empty: 'none', egg: 'egg', small: 'larva', medium: 'larva', large: 'larva', capped: 'capped', opened: 'out' },
  ...{ unread: null, dead: null, parasitised: null, webbed: null, damaged: null },
};

function looksByCell(readings: readonly BroodReading[], clock: DevelopmentClock): StageLook[][] {
  const sorted = [...readings].sort((a, b) => a.at - b.at);
  const start = sorted[0]?.at ?? 0;
  const looks = sorted.flatMap(({ at, marks }) => {
    const day = developmentDays(clock, [start, at]);
    return marks.flatMap((mark) => {
      const seen = SEEN[mark.state];
      return seen === null ? [] : [{ key: cellKey(mark), day, seen }];
    });
  });
  return [...groupBy(looks, ({ key }) => key).values()];
}

/** The whole stages seen in one nest, timed by its temperature record where there is one. */
export async function nestSpans(
  scope: TeamScope,
  nest: NestRow,
  { zone, asOf, heat }: { zone: string; asOf: number; heat: TemperatureSettings },
): Promise<BroodSpan[]> {
  const { readings, temperature, place } = await broodInput(scope, nest, { zone, asOf });
  const clock = developmentClock(temperature, heat, { zone, place });
  return looksByCell(readings, clock).flatMap(broodSpans);
}
