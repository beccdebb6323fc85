import 'server-only';
import { z } from 'zod';
import { idText } from '@/lib/protocol/member-types';
import { emailText } from '@/lib/server/commands/members/inputs';

/** Body of a question for a new password. */
export const FORGOTTEN_INPUT = z.strictObject({ email: emailText });

/** Body of a new password by link. */
export const RESET_INPUT = z.strictObject({ token: z.string(), password: z.string() });

/** Body of a change of one's own password. */
export const PASSWORD_INPUT = z.strictObject({ current: z.string(), password: z.string() });

/** Body of a step into another of one's teams. */
export const TEAM_INPUT = z.strictObject({ team: idText });
