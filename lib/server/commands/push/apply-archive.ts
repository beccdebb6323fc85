import 'server-only';
import { entityOf } from '@/lib/protocol/entity-of';
import { type Application, instantOf } from './application';
import { noteChange } from './writes';

/** `entity.archive`: puts a nest or visit away. What arrives for it later is applied and flagged. */
export function applyArchive({ world, writes, op }: Application): void {
  const entity = entityOf(op);
  const archived_at = instantOf(op.at.wall);
  const nest = entity?.type === 'nest' ? world.nests.get(entity.id) : undefined;
  const visit = entity?.type === 'visit' ? world.visits.get(entity.id) : undefined;
  if (entity && nest && !nest.archived) {
    world.nests.set(entity.id, { archived: true });
    noteChange(writes.nestChanges, entity.id, { archived_at });
  }
  if (entity && visit && !visit.archived) {
    world.visits.set(entity.id, { ...visit, archived: true });
    noteChange(writes.visitChanges, entity.id, { archived_at });
  }
}
