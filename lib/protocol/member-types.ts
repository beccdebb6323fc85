import * as z from 'zod';
import { isUuidText } from '@/lib/kit/uuid';
import { MAX_NAME, MAX_TEXT } from './limits';

/** Text of at most `max` code points. */
function text(max: number) {
  return z.string().refine((value) => [...value].length <= max, { message: 'too-long' });
}

/** A lower-case UUID text. */
export const idText = z.string().refine(isUuidText, { message: 'id' });

/** Free text. */
export const wordsText = text(MAX_TEXT);

/** A name, label or code. */
export const nameText = text(MAX_NAME);

/** A place: degrees WGS 84, accuracy in metres. */
export const placeValue = z.strictObject({
  lat: z.number().min(-90).max(90),
  lon: z.number().min(-180).max(180),
  accuracyM: z.number().min(0).max(100_000).nullish(),
});
