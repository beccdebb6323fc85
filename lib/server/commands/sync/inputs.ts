import 'server-only';
import { z } from 'zod';
import type { Json } from '@/lib/protocol/canonical-json';
import { isCleanText } from '@/lib/protocol/check-text';
import { PROTOCOL } from '@/lib/protocol/limits';
import { idText, nameText } from '@/lib/protocol/member-types';

/** Body of an enrolment: a name that tells this phone from the others. */
export const ENROL_INPUT = z.strictObject({ label: nameText.min(1).refine(isCleanText) });

/** Body of a push. The operations are judged one by one, so that a bad one does not stop the rest. */
export const PUSH_INPUT = z.strictObject({
  protocol: z.literal(PROTOCOL),
  schema: z.number().int().min(1),
  epoch: z.number().int().min(0),
  ops: z.array(z.custom<Json>(() => true)),
});

/** Body of "have you got these?". */
export const HAVE_INPUT = z.strictObject({ opIds: z.array(idText) });
