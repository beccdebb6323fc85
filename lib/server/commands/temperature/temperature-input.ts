import 'server-only';
import { z } from 'zod';
import { isPossible } from '@/lib/brood/temperature/record';
import { addDays } from '@/lib/kit/local-date';
import { isCleanText } from '@/lib/protocol/check-text';
import { MAX_NAME } from '@/lib/protocol/limits';
import { DECISION_REASON } from '@/lib/server/commands/readings/decision-reason';

/** Largest file, in characters: a season in steps of two minutes. */
const MAX_FILE = 4 * 1024 * 1024;

/** Largest request body in bytes: the file with its quotes escaped. */
export const MAX_TEMPERATURE_BYTES = 6 * 1024 * 1024;

/** Most days noted in one go. */
const MAX_DAYS = 400;

const LONE_SURROGATE = /[\ud800-\udfff]/u;

const FILE_TEXT = z
  .string()
  .min(1)
  .max(MAX_FILE)
  .refine((text) => !LONE_SURROGATE.test(text));

/** What a person said about a file. */
const ANSWERS = z.strictObject({
  order: z.enum(['dmy', 'mdy']).optional(),
  unit: z.enum(['C', 'F']).optional(),
  column: z.int().min(0).max(1000).optional(),
});

const DATE = z
  .string()
  .regex(/^[12]\d{3}-\d{2}-\d{2}$/)
  .refine((date) => !Number.isNaN(Date.parse(`${date}T00:00:00Z`)) && addDays(date, 0) === date);
const CELSIUS = z.number().refine(isPossible);

const DAY = z
  .strictObject({ date: DATE, min: CELSIUS, max: CELSIUS })
  .refine(({ min, max }) => min <= max, { message: 'the lowest is above the highest' });

const DAYS = z
  .array(DAY)
  .min(1)
  .max(MAX_DAYS)
  .refine((days) => new Set(days.map(({ date }) => date)).size === days.length);

/** Body of `POST /api/nests/<id>/temperature/preview`. */
export const PREVIEW_INPUT = z.strictObject({ text: FILE_TEXT, answers: ANSWERS.optional() });

/** A record this one stands in for, and why. */
const REPLACES = z.strictObject({ id: z.uuid(), reason: DECISION_REASON });

/** Body of `POST /api/nests/<id>/temperature`: a file, or days noted by hand. */
export const KEEP_INPUT = z.union([
  z.strictObject({
    text: FILE_TEXT,
    fileName: z.string().max(MAX_NAME).refine(isCleanText).optional(),
    answers: ANSWERS.optional(),
    replaces: REPLACES.optional(),
  }),
  z.strictObject({ days: DAYS, replaces: REPLACES.optional() }),
]);

/** A file, or days noted by hand. */
export type KeepInput = z.output<typeof KEEP_INPUT>;

/** Body of `POST /api/nests/<id>/temperature/<record>/remove`. */
export const REMOVE_INPUT = z.strictObject({ reason: DECISION_REASON });
