import { type Axial, cellKey } from '@/lib/comb/axial';
import type { Mark } from '@/lib/comb/mark';
import type { CellState } from '@/lib/comb/states';
import type { Op } from '@/lib/protocol/op';
import type { CommitEntry } from './commit-op';
import { type CommitQueue, createCommitQueue } from './commit-queue';
import { type OpMaker, type OpRequest, type OpenDraft, beginOp } from './make-op';
import { markOfOp } from './mark-of-op';
import type { NotSavedReason } from './not-saved';
import { markWords, skipWords, undoneWords } from './op-words';
import {
  type CombState,
  NO_TOGGLES,
  type RecorderState,
  afterSaving,
  combState,
  keepsComb,
  liveMarkAt,
  markBefore,
  marksAt,
  provisionalHlc,
  recorderView,
} from './recorder-state';
import type { PressDetail, RecorderControls, RecorderPlace, RecorderView, Toggles } from './recorder-view';
import { type OwnSignal, type Signal, createSignal } from './signal';

/** What a recorder works with. */
export interface RecorderPorts {
  maker: OpMaker;
  /** Saves an entry; rejects with `NotSavedError`. */
  commit(entry: CommitEntry): Promise<Op[]>;
}

type Content = { state: CellState } & Partial<Toggles> & PressDetail;

type RecorderKind = 'cell.mark' | 'cell.retract' | 'reading.submit';

/**
 * The recorder of one reading, apart from any screen. It keeps the reading in memory and appends, so that a press costs
 * the same at 500 cells; every press goes to the disk at once, and counts as saved only when its transaction has
 * completed.
 */
export class CombRecorder implements RecorderControls {
  private readonly signal: OwnSignal<RecorderView>;
  private readonly queue: CommitQueue;
  private comb: CombState;

  constructor(
    private readonly ports: RecorderPorts,
    private state: RecorderState,
  ) {
    this.comb = combState(state);
    this.signal = createSignal(recorderView(state, this.comb));
    this.queue = createCommitQueue({
      sha256: ports.maker.sha256,
      commit: ports.commit,
      saved: (ops: readonly Op[]) => this.change(afterSaving(this.state, ops)),
      failed: (failure: NotSavedReason) => this.change({ failure }),
    });
  }

  /** What the screen draws. */
  get view(): Signal<RecorderView> {
    return this.signal;
  }

  /** What is not saved yet, for an export. */
  unsaved(): readonly OpenDraft[] {
    return this.queue.waiting();
  }

  /** Takes in what another tab has done meanwhile. Ignored while something is on its way to the disk. */
  reload(fresh: RecorderState): void {
    const { pending, lastWords, place } = this.state;
    if (pending.length === 0) this.change({ ...fresh, lastWords, place });
  }

  press = (seen: CellState, detail: PressDetail = {}): void => {
    const { current } = this.signal.get();
    const { place } = this.state;
    const after = { ...place, jump: null, toggles: NO_TOGGLES };
    if (current) this.mark(current, { ...place.toggles, ...detail, state: seen }, after);
  };

  paint = (cell: Axial, seen: CellState): void => this.mark(cell, { state: seen }, this.state.place);

  paintAll = (cells: readonly (Axial & { state: CellState })[]): void => {
    const { place, ...state } = this.state;
    const drafts: OpenDraft[] = [];
    const marks = [...state.marks];
    for (const { q, r, state: seen } of cells) {
      const { draft, made } = this.makeMark({ q, r }, { state: seen }, marks);
      drafts.push(draft);
      marks.push(made);
    }
    const last = marks.at(-1);
    if (drafts.length === 0 || !last) return;
    const painted = new Set(cells.map(cellKey));
    const skipped = place.skipped.filter((key) => !painted.has(key));
    this.put(drafts, { marks, place: { ...place, skipped }, lastWords: markWords(last) });
  };

  toggle = (name: keyof Toggles): void => {
    const { toggles } = this.state.place;
    this.move({ toggles: { ...toggles, [name]: !toggles[name] } });
  };

  jump = (cell: Axial | null): void => this.move({ jump: cell });

  skip = (): void => {
    const { current } = this.signal.get();
    if (!current) return;
    const { place, retracted } = this.state;
    // A cell that was marked and is not there after all loses every mark it has.
    const targets = marksAt(this.state, current).map(({ opId }) => opId);
    const drafts = targets.map((target) => this.begin('cell.retract', { target }));
    const skipped = [...new Set([...place.skipped, cellKey(current)])];
    this.put(drafts, {
      retracted: new Set([...retracted, ...targets]),
      place: { ...place, jump: null, skipped },
      lastWords: skipWords(current),
    });
  };

  unskip = (cell: Axial): void => {
    this.move({ jump: cell, skipped: this.state.place.skipped.filter((key) => key !== cellKey(cell)) });
  };

  expect = (expectedTotal: number | null): void => this.move({ expectedTotal });

  undo = (): void => {
    const target = this.comb.undoTarget;
    if (!target) return;
    const draft = this.begin('cell.retract', { target: target.opId });
    const { q, r } = target;
    this.put([draft], {
      retracted: new Set([...this.state.retracted, target.opId]),
      place: { ...this.state.place, jump: { q, r } },
      lastWords: undoneWords(target, markBefore(this.state, target)?.state ?? null),
    });
  };

  submit = (): Promise<void> => {
    const draft = this.begin('reading.submit', {});
    return this.save([draft], { submitted: true, lastWords: 'Reading handed in' });
  };

  retryUnsaved = (): void => {
    this.change({ failure: null });
    this.queue.retry();
  };

  private change(part: Partial<RecorderState>): void {
    this.state = { ...this.state, ...part };
    if (!keepsComb(part)) this.comb = combState(this.state);
    this.signal.set(recorderView(this.state, this.comb, this.signal.get()));
  }

  private begin<K extends RecorderKind>(kind: K, body: OpRequest<K>['body']): OpenDraft {
    const { mayMark, nest, visit, reading } = this.state;
    if (!mayMark) throw new Error('only the person who opened a reading may mark in it');
    return beginOp(this.ports.maker, { kind, nest, visit, reading, body });
  }

  /** Sends a change on its way to the disk; the screen shows it at once, as not saved yet. */
  private save(drafts: readonly OpenDraft[], part: Partial<RecorderState>): Promise<void> {
    const pending = [...this.state.pending, ...drafts.map((draft) => draft.opId)];
    this.change({ ...part, pending, failure: null });
    return this.queue.add(drafts, this.state.place);
  }

  private put(drafts: readonly OpenDraft[], part: Partial<RecorderState>): void {
    this.save(drafts, part).catch(() => undefined);
  }

  private move(part: Partial<RecorderPlace>): void {
    this.put([], { place: { ...this.state.place, ...part } });
  }

  /** A mark that comes after the given ones, and the operation for it. */
  private makeMark({ q, r }: Axial, { state, ...content }: Content, marks: readonly Mark[]) {
    const draft = this.begin('cell.mark', {
      q,
      r,
      state,
      nectar: content.nectar ?? false,
      unsure: content.unsure ?? false,
      reused: content.reused || undefined,
      scrap: content.scrap || undefined,
      note: content.note || undefined,
      instar: content.instar ?? undefined,
      supersedes: liveMarkAt({ ...this.state, marks }, { q, r })?.opId,
    });
    const made = markOfOp({ ...draft, hlc: provisionalHlc({ marks }, this.ports.maker.clock.now()) });
    if (!made) throw new RangeError(`no cell at ${q}, ${r}`);
    return { draft, made };
  }

  private mark({ q, r }: Axial, content: Content, place: RecorderPlace): void {
    const { draft, made } = this.makeMark({ q, r }, content, this.state.marks);
    // A cell that was found missing and is marked after all is there.
    const skipped = place.skipped.filter((key) => key !== cellKey({ q, r }));
    const marks = [...this.state.marks, made];
    this.put([draft], { marks, place: { ...place, skipped }, lastWords: markWords(made) });
  }
}
