import 'server-only';
import { z } from 'zod';
import { isCleanText } from '@/lib/protocol/check-text';
import { nameText } from '@/lib/protocol/member-types';
import { ROLES } from '@/lib/server/auth/role';
import { emailKey } from '@/lib/server/auth/sign-in';

/** As long as the column; the standard's longest address is 254. */
const MAX_EMAIL = 200;

/** Something at something with a dot; whether anybody reads it only the letter can tell. */
const EMAIL = /^[^\s@<>()[\]\\,;:"]+@[^\s@<>()[\]\\,;:"]+\.[^\s@<>()[\]\\,;:".]+$/u;

/** An e-mail address, in the spelling accounts are looked up by. */
export const emailText = z
  .string()
  .max(MAX_EMAIL)
  .transform(emailKey)
  .refine((email) => EMAIL.test(email) && isCleanText(email));

/** Words of a person on one line: a name, a reason. */
export const lineText = nameText
  .transform((text) => text.trim())
  .refine((text) => text !== '' && isCleanText(text) && !/[\n\t]/.test(text));

/** One of the five role words. */
const roleWord = z.enum(ROLES);

/** Body of an invitation. */
export const INVITE_INPUT = z.strictObject({ email: emailText, role: roleWord });

/** Body of an act that needs nothing said beside its address. */
export const NOTHING_INPUT = z.strictObject({});

/** Body of a change of role. */
export const ROLE_INPUT = z.strictObject({ role: roleWord });

/** Body of the answer to an invitation; the name is null for a person who has an account. */
export const ACCEPT_INPUT = z.strictObject({ token: z.string(), name: lineText.nullable(), password: z.string() });
