import 'server-only';
import { z } from 'zod';
import { TRUE_CLASSES } from '@/lib/brood/team-settings/confusion-rows';
import { isTrust } from '@/lib/brood/trust';
import { isCleanText } from '@/lib/protocol/check-text';
import { MAX_NAME } from '@/lib/protocol/limits';
import { DECISION_REASON } from '@/lib/server/commands/readings/decision-reason';

const TRUST = z.custom<'medium' | 'low' | 'very low' | 'assumption'>(isTrust);
const TEXT = z.string().max(MAX_NAME).refine(isCleanText);

const ORIGIN = { trust: TRUST, source: TEXT };
const VALUE = z.strictObject({ value: z.number(), ...ORIGIN });
const ROW = z.strictObject({ row: z.record(z.string(), z.number()), ...ORIGIN });

const DURATION = z.strictObject({
  ...{ taxon: TEXT.refine((text) => text.trim() !== ''), egg: z.number(), larva: z.number(), capped: z.number() },
  ...{ referenceC: z.number(), publishedTotal: z.number().optional(), ...ORIGIN },
});

const FACTOR = z.strictObject({
  ...{ taxon: TEXT.refine((text) => text.trim() !== ''), logMean: z.number(), logSd: z.number() },
  ...ORIGIN,
});

/** Body of `PUT /api/settings/draft`: what changes; anything left out stays as it is in the draft. */
export const DRAFT_INPUT = z.strictObject({
  values: z.record(z.string(), VALUE).optional(),
  confusion: z.partialRecord(z.enum(TRUE_CLASSES), ROW).optional(),
  /** All rows, in place of those before. */
  durations: z.array(DURATION).max(200).optional(),
  /** All factors, in place of those before. */
  durationFactors: z.array(FACTOR).max(200).optional(),
});

/** What changes in a draft. */
export type DraftInput = z.output<typeof DRAFT_INPUT>;

/** Body of `POST /api/settings/draft/discard`. */
export const DISCARD_INPUT = z.strictObject({});

/** Body of `POST /api/settings/sign`: why, and the version the draft was looked at against. */
export const SIGN_INPUT = z.strictObject({ reason: DECISION_REASON, basedOn: z.int().min(0) });
