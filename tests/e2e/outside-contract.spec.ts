import { expect, test } from '@playwright/test';
import type { BroodEstimate } from '@/lib/brood/answer';
import { freshIds, markOp, openingOps } from '@/tests/support/wire/first-visit';
import { WireClient } from '@/tests/support/wire/wire-client';
import { wireOp } from '@/tests/support/wire/wire-op';
import { origin } from '@/tests/support/running-server';

interface ReadingAnswer {
  id: string;
  kind: string;
  observer: string;
  marks: { cell: number; q: number; r: number; state: string; opId: string }[];
  tally: Record<string, number>;
  lockedVersion: number | null;
}

test.describe('the contract, from outside', () => {
  test('a reading goes from a phone to a settled, locked and amended census and out as CSV', async () => {
    const technician = new WireClient(origin());
    expect(await technician.signIn('technician@tarrow.example')).toBe(200);
    await technician.enrol();
    const ids = freshIds();
    const code = `C${Date.now() % 100000}`;
    const egg = markOp(ids, { q: 0, r: 0, state: 'egg', nectar: true });
    const large = markOp(ids, { q: 0, r: -1, state: 'large' });
    const ops = [...openingOps(ids, code), egg, large];
    const pushed = await technician.push(ops);
    expect(pushed.results.map((result) => result.r)).toEqual(ops.map(() => 'applied'));
    expect((await technician.push(ops)).results.map((result) => result.r)).toEqual(ops.map(() => 'duplicate'));
    expect((await technician.have([egg.opId, ids.nest])).sort()).toEqual([egg.opId]);

    const reading = await technician.get<ReadingAnswer>(`/api/readings/${ids.reading}`);
    expect(reading.tally).toMatchObject({ cellsTotal: 2, egg: 1, large: 1, nectarCells: 1, unread: 0 });
    expect(reading.marks.map((mark) => [mark.cell, mark.state])).toEqual([
      [0, 'egg'],
      [1, 'large'],
    ]);
    const brood = await technician.get<BroodEstimate>(`/api/nests/${ids.nest}/brood?asOf=2026-06-16T12:00:00Z`);
    expect(brood.cells).toHaveLength(2);
    expect(brood.nest.firstEmergence?.p80[0]).toMatch(/^2026-0[67]-\d\d$/);

    const settle = { cells: [{ q: 0, r: 0, state: 'small', reason: 'The head shows in the photo.' }] };
    expect((await technician.post(`/api/readings/${ids.reading}/settle`, settle)).status).toBe(403);
    const reviewer = new WireClient(origin());
    await reviewer.signIn('reviewer@tarrow.example');
    const settled = (await (await reviewer.post(`/api/readings/${ids.reading}/settle`, settle)).json()) as {
      reading: string;
      version: number;
    };
    expect(settled.version).toBe(1);
    expect((await reviewer.post(`/api/readings/${ids.reading}/lock`, {})).status).toBe(200);
    expect((await reviewer.post(`/api/readings/${ids.reading}/settle`, settle)).status).toBe(409);
    const final = await reviewer.get<ReadingAnswer>(`/api/readings/${settled.reading}`);
    expect(final).toMatchObject({ kind: 'final', lockedVersion: 1 });
    expect(final.tally).toMatchObject({ cellsTotal: 2, small: 1, large: 1, egg: 0 });
    const untouched = await reviewer.get<ReadingAnswer>(`/api/readings/${ids.reading}`);
    expect(untouched.tally).toMatchObject({ egg: 1, small: 0 });

    const tallies = await (await reviewer.fetch(`/api/export/tallies.csv?nest=${code}`)).text();
    const rows = tallies.split('\r\n');
    expect(rows[0]).toBe(
      'team,nest,visit,visit_date,reading,reading_kind,observer,taxon,cells_total,empty,egg,small,medium,large,capped,opened,dead,parasitised,webbed,damaged,unread,nectar_cells,locked_version',
    );
    expect(rows).toHaveLength(4);
    expect(tallies.endsWith('\r\n')).toBe(true);
    const cells = await (await reviewer.fetch(`/api/export/cells.csv?nest=${code}`)).text();
    expect(cells).toContain(`,0,0,0,small,,yes,no,no,2026-06-16T05:41:07.120-04:00,${egg.opId}\r\n`);
    const amended = (await (
      await reviewer.post(`/api/readings/${ids.reading}/amend`, { reason: 'A later photo.' })
    ).json()) as { version: number };
    expect(amended.version).toBe(2);
  });

  test('marks by anybody but the person who opened the reading are refused, and both readings stay', async () => {
    const first = new WireClient(origin());
    await first.signIn('technician@tarrow.example');
    await first.enrol();
    const ids = freshIds();
    await first.push([...openingOps(ids, 'TWO-PHONES'), markOp(ids, { q: 0, r: 0, state: 'egg' })]);
    const second = new WireClient(origin());
    await second.signIn('technician2@tarrow.example');
    await second.enrol();
    const own = { ...ids, reading: freshIds().reading };
    const answer = await second.push([
      markOp(ids, { q: 0, r: 0, state: 'small' }),
      wireOp({ kind: 'reading.open', ...own, body: { kind: 'field', source: 'phone' } }),
      markOp(own, { q: 0, r: 0, state: 'small' }),
    ]);
    expect(answer.results.map((result) => [result.r, result.code ?? null])).toEqual([
      ['refused', 'right'],
      ['applied', null],
      ['applied', null],
    ]);
    const nest = await first.get<{ visits: { readings: { id: string }[] }[] }>(`/api/nests/${ids.nest}`);
    expect(nest.visits[0]?.readings).toHaveLength(2);
  });

  test('pull pages put together are the log, gapless and in order', async () => {
    const phone = new WireClient(origin());
    await phone.signIn('technician@tarrow.example');
    await phone.enrol();
    const seqs: number[] = [];
    let page = await phone.pull('?limit=200');
    for (;;) {
      seqs.push(...page.rows.map((row) => row.seq));
      if (!page.more) break;
      page = await phone.pull(`?limit=200&cursor=${page.next}`);
    }
    expect(seqs).toEqual(seqs.map((_, index) => index + 1));
  });
});
