import 'server-only';
import { Op } from 'sequelize';
import { systemClock } from '@/lib/kit/system-clock';
import { database } from '@/lib/server/db/database';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { tokenHash } from './secret-link';

/** Whose password a link may set; null for a link that was used, has run out or never was one. */
export async function openReset(token: string, nowMs = systemClock.now()): Promise<string | null> {
  const hash = tokenHash(token);
  if (!hash) return null;
  const row = await database().models.ResetToken.findOne({
    where: { token_hash: hash, used_at: null, expires_at: { [Op.gt]: new Date(nowMs) } },
  });
  return row && fromBinary(row.user_id);
}
