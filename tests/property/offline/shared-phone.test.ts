import { afterEach, describe, expect, test, vi } from 'vitest';
import { spiral } from '@/lib/comb/walk';
import { EVERYDAY_STATES } from '@/lib/comb/states';
import { HandedPhone } from '@/tests/support/sim/handed-phone';

const SEEDS = process.env.LONG === '1' ? [1, 2, 3, 4, 5, 6, 7, 8, 9, 10] : [1, 2];
const SWITCHES = 60;
const MARKS = 50;
const PEOPLE = ['tobiah', 'oriel'] as const;

type Who = (typeof PEOPLE)[number];

const open: HandedPhone[] = [];

afterEach(() => {
  for (const phone of open.splice(0)) phone.session?.standing.get().records?.close();
});

/** A phone that passes between two people, and what each of them has recorded on it. */
class Handing {
  readonly phone: HandedPhone;
  readonly recorded: Record<Who, Set<string>> = { tobiah: new Set(), oriel: new Set() };

  constructor(seed: number) {
    this.phone = new HandedPhone(seed);
    open.push(this.phone);
  }

  private below(n: number): number {
    return Math.floor(this.phone.random() * n);
  }

  /** The person signs in where there is signal, and the office takes nothing for the moment. */
  async comes(who: Who): Promise<void> {
    Object.assign(this.phone.office, { cookie: who, online: true, takesPushes: false });
    await this.phone.open();
    expect(this.phone.shown()).toBe(who);
  }

  /** The person records something with no signal. */
  async records(who: Who, cells: number): Promise<void> {
    const { commands } = this.phone.records();
    const nest = await commands.openNest({ code: `${who}-${this.below(99)}` });
    const visit = await commands.openVisit({ nest, purpose: 'check' });
    const reading = await commands.openReading({ nest, visit, kind: 'field', source: 'phone' });
    const comb = await this.phone.records().recorder(reading);
    if (!comb) throw new Error('the reading is not on this phone');
    for (const _cell of spiral(cells)) comb.press(EVERYDAY_STATES[this.below(6)] ?? 'egg');
    await vi.waitFor(() => expect(comb.view.get()).toMatchObject({ pending: 0, saved: cells }));
    this.phone.records().closeRecorder(reading);
    for (const key of await this.keys()) this.recorded[who].add(key);
  }

  /** The person goes: by signing out with or without signal, by their session's end, or by a dead battery. */
  async goes(): Promise<void> {
    const way = this.below(4);
    this.phone.office.online = way !== 0;
    if (way <= 1) await this.phone.session?.signOut();
    if (way === 2) this.phone.office.cookie = null;
    if (way === 3) this.phone.records().close();
  }

  /** What the database that is open now holds. */
  keys(): Promise<string[]> {
    return this.phone.records().db.ops.toCollection().primaryKeys();
  }

  /** Nothing of the other one is shown, and nothing of one's own is missing. */
  async check(who: Who): Promise<void> {
    expect(new Set(await this.keys())).toEqual(this.recorded[who]);
    expect((await this.phone.records().store.counts()).queued).toBe(this.recorded[who].size);
  }

  /** The office takes pushes again and the person's work goes. */
  async sends(who: Who): Promise<void> {
    await this.comes(who);
    this.phone.office.takesPushes = true;
    this.phone.records().wake('manual');
    const { clock } = this.phone;
    const step = async () => {
      await clock.pass(200);
      expect((await this.phone.records().store.counts()).queued).toBe(0);
    };
    await vi.waitFor(step, { timeout: 20_000, interval: 5 });
    await this.phone.session?.signOut();
  }
}

/** I24 of the sync protocol: signing out destroys nothing unsent, and the next person sees none of it. */
describe('a phone with unsent marks that passes between two people', () => {
  test.each(SEEDS)(
    `shows nothing of the one to the other and loses nothing in ${SWITCHES} switches, seed %i`,
    { timeout: 120_000 },
    async (seed) => {
      const handing = new Handing(seed);
      await handing.comes('tobiah');
      await handing.records('tobiah', MARKS);
      expect(handing.recorded.tobiah.size).toBe(MARKS + 3);
      for (let turn = 1; turn <= SWITCHES; turn++) {
        await handing.goes();
        const who = PEOPLE[turn % 2] ?? 'oriel';
        await handing.comes(who);
        await handing.check(who);
        if (turn % 10 === 1) await handing.records(who, 2);
      }
      for (const who of PEOPLE) await handing.sends(who);
      const { taken, contradicted } = handing.phone.office;
      for (const who of PEOPLE) {
        const theirs = [...taken.values()].filter(({ from }) => from === who).map(({ opId }) => opId);
        expect(new Set(theirs)).toEqual(handing.recorded[who]);
      }
      expect(contradicted).toEqual([]);
      expect(taken.size).toBe(handing.recorded.tobiah.size + handing.recorded.oriel.size);
    },
  );
});
