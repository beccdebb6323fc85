import 'server-only';
import { type DurationRow, durationsFor } from '@/lib/brood/durations';
import type { BroodSpan } from '@/lib/brood/learning/brood-spans';
import { type LearnedRow, learnConfusion } from '@/lib/brood/learning/confusion-learning';
import { type LearnedFactor, type StageExpectation, learnDurations } from '@/lib/brood/learning/duration-learning';
import { DEFAULT_LEARNING, type LearningSettingName } from '@/lib/brood/learning/learning-settings';
import { DEFAULT_CONFUSION } from '@/lib/brood/team-settings/confusion-rows';
import type { SettingsContent } from '@/lib/brood/team-settings/content';
import { temperatureSettings } from '@/lib/brood/temperature/temperature-settings';
import { groupBy } from '@/lib/kit/group-by';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { broodSettingsOf } from '@/lib/server/queries/brood-settings';
import type { NestRow } from '@/lib/server/queries/nest-rows';
import { type TeamScope, teamScope } from '@/lib/server/queries/team-scope';
import { nestSpans } from './nest-spans';
import { latestVersion } from './settings-rows';
import { settledCells } from './settled-cells';

/** What a taxon's nests say about its durations. */
export interface LearnedDurations extends LearnedFactor {
  /** The row that serves those nests. */
  row: DurationRow;
}

/** The answer of `GET /api/settings/learning`. Nothing of it counts until it is signed into a version. */
export interface LearningAnswer {
  /** The version whose numbers weigh the update; rows before are the product's, so that no cell counts twice. */
  version: number;
  pseudoCount: number;
  confusion: LearnedRow[];
  /** Cells that two people read, once for each reader. */
  cells: number;
  durations: LearnedDurations[];
}

/** What the spans of one nest are timed by. */
interface Timing {
  zone: string;
  asOf: number;
  content: SettingsContent;
}

const numberOf = ({ values }: SettingsContent, name: LearningSettingName): number =>
  values[name]?.value ?? DEFAULT_LEARNING[name].value;

/** Individual variation of the whole larva: four short instars and a long one, each with the instars' own. */
function larvaCv(cvInstar: number, instar5Share: number): number {
  return cvInstar * Math.sqrt(4 * ((1 - instar5Share) / 4) ** 2 + instar5Share ** 2);
}

function expectationOf({ egg, larva, capped }: DurationRow, content: SettingsContent): StageExpectation {
  const { cvEgg, cvInstar, cvCapped, instar5Share } = broodSettingsOf(content, '').values;
  return {
    mean: { egg, larva, capped },
    cv: { egg: cvEgg.value, larva: larvaCv(cvInstar.value, instar5Share.value), capped: cvCapped.value },
  };
}

async function spansOf(scope: TeamScope, nest: NestRow, { zone, asOf, content }: Timing) {
  const { values } = broodSettingsOf(content, '');
  const { row } = durationsFor(nest.taxon, content.durations);
  const spans: BroodSpan[] = await nestSpans(scope, nest, {
    ...{ zone, asOf },
    heat: temperatureSettings(values, row.referenceC),
  });
  return { row, spans };
}

async function learnedDurations(
  scope: TeamScope,
  nests: readonly NestRow[],
  timing: Timing,
): Promise<LearnedDurations[]> {
  const followed = [];
  for (const nest of nests) followed.push(await spansOf(scope, nest, timing));
  const { content } = timing;
  const nestCv = broodSettingsOf(content, '').values.nestFactorCv.value;
  return [...groupBy(followed, ({ row }) => row.taxon).values()].flatMap((group) => {
    const row = group[0]?.row;
    const learned =
      row &&
      learnDurations(group, {
        expectation: expectationOf(row, content),
        sd: numberOf(content, 'learnDurationSd'),
        betweenNests: Math.sqrt(Math.log(1 + nestCv ** 2)),
      });
    return row && learned ? [{ ...learned, row }] : [];
  });
}

/**
 * `GET /api/settings/learning`: what the team's own double readings and followed broods say about readers and
 * durations, before and after, with how many cells and nests it rests on.
 *
 * @param nowMs epoch milliseconds.
 */
export async function learning(ctx: TeamContext, nowMs: number): Promise<LearningAnswer> {
  const scope = teamScope(ctx);
  const { version, content } = await latestVersion(scope);
  const where = { team_id: scope.team, archived_at: null };
  const nests = await scope.db.models.Nest.findAll({ where, order: [['id', 'ASC']], raw: true });
  const cells = await settledCells(
    scope,
    nests.map(({ id }) => id),
  );
  const pseudoCount = numberOf(content, 'learnPseudoCount');
  return {
    version,
    pseudoCount,
    confusion: learnConfusion(cells, DEFAULT_CONFUSION, pseudoCount),
    cells: cells.length,
    durations: await learnedDurations(scope, nests, { zone: ctx.zone, asOf: nowMs, content }),
  };
}
