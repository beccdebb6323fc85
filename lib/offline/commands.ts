import type { SheetMark } from '@/lib/comb/sheet-letters';
import type { OpKind } from '@/lib/protocol/op';
import type { OpBody } from '@/lib/protocol/op-bodies';
import type { Json } from '@/lib/protocol/canonical-json';
import type { CommitEntry } from './commit-op';
import { type OpMaker, type OpRequest, makeOp } from './make-op';
import type { Place } from './nest-view';
import { wallText } from './phone-clock';

/** Which entity a field or note belongs to. */
export interface Target {
  nest: string;
  visit?: string | null;
  reading?: string | null;
  entity: 'nest' | 'visit' | 'reading';
  /** `opId` of the value the person edited; null when there was none. */
  base: string | null;
}

/** What the screens can record besides marks. Each resolves when its transaction has completed. */
export interface Commands {
  /** Opens a nest; resolves to its id. */
  openNest(input: OpBody<'nest.open'> & { place?: Place | null }): Promise<string>;
  /** Opens a visit of a nest; resolves to its id. */
  openVisit(input: { nest: string; purpose: OpBody<'visit.open'>['purpose'] }): Promise<string>;
  /** Opens a reading of a visit; resolves to its id. */
  openReading(input: { nest: string; visit: string } & OpBody<'reading.open'>): Promise<string>;
  /** Opens a reading of a filled paper sheet and puts all its marks in it, together or not at all; resolves to its id. */
  openTypedReading(input: { nest: string; visit: string; marks: readonly SheetMark[] }): Promise<string>;
  setField(input: Target & { field: string; value: Json }): Promise<void>;
  setNote(input: Target & { text: string }): Promise<void>;
}

/** What commands work with. */
export interface CommandPorts {
  maker: OpMaker;
  /** Saves an entry; rejects with `NotSavedError`. */
  commit(entry: CommitEntry): Promise<unknown>;
}

/** A field's value as the protocol allows it. */
type FieldValue = OpBody<'field.set'>['value'];

function envelope({ nest, visit = null, reading = null }: Target) {
  return { nest, visit, reading };
}

/** Makes the commands of an open session. They reject with `NotSavedError` when the phone cannot keep something. */
export function createCommands({ maker, commit }: CommandPorts): Commands {
  async function record<K extends OpKind>(request: OpRequest<K>): Promise<void> {
    await commit({ drafts: [await makeOp(maker, request)] });
  }
  return {
    openNest: async (body) => {
      const nest = maker.newId();
      await record({ kind: 'nest.open', nest, visit: null, reading: null, body });
      return nest;
    },
    openVisit: async ({ nest, purpose }) => {
      const visit = maker.newId();
      const startedAt = wallText(maker.clock, maker.clock.now());
      await record({ kind: 'visit.open', nest, visit, reading: null, body: { purpose, startedAt } });
      return visit;
    },
    openReading: async ({ nest, visit, ...body }) => {
      const reading = maker.newId();
      await record({ kind: 'reading.open', nest, visit, reading, body });
      return reading;
    },
    openTypedReading: async ({ nest, visit, marks }) => {
      const reading = maker.newId();
      const within = { nest, visit, reading };
      const opening = await makeOp(maker, {
        kind: 'reading.open',
        ...within,
        body: { kind: 'field', source: 'paper' },
      });
      const drafts = [opening];
      for (const mark of marks) drafts.push(await makeOp(maker, { kind: 'cell.mark', ...within, body: mark }));
      await commit({ drafts });
      return reading;
    },
    setField: ({ field, value, entity, base, ...target }) => {
      // The schema of the operation judges the value when it is made.
      const body = { entity, field, value: value as FieldValue, base };
      return record({ kind: 'field.set', ...envelope({ ...target, entity, base }), body });
    },
    setNote: ({ text, entity, base, ...target }) =>
      record({ kind: 'note.set', ...envelope({ ...target, entity, base }), body: { entity, text, base } }),
  };
}
