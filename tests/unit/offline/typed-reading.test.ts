import { afterEach, expect, test } from 'vitest';
import { readSheet } from '@/lib/comb/sheet-letters';
import { readReading } from '@/lib/offline/read-records';
import { HandedPhone } from '@/tests/support/sim/handed-phone';

const open: HandedPhone[] = [];

afterEach(() => {
  for (const phone of open.splice(0)) phone.session?.standing.get().records?.close();
});

async function visit() {
  const phone = new HandedPhone(1);
  open.push(phone);
  Object.assign(phone.office, { cookie: 'tobiah', takesPushes: false });
  await phone.open();
  const { commands } = phone.records();
  const nest = await commands.openNest({ code: 'N01' });
  return { phone, nest, visit: await commands.openVisit({ nest, purpose: 'take-down' }) };
}

const marks = readSheet(['c', "o'sl?.m-"]).flatMap((line) => line.marks);

test('a typed sheet becomes a reading from paper with every mark, and none where there is no cell', async () => {
  const { phone, nest, visit: at } = await visit();
  const { db, commands } = phone.records();
  const reading = await commands.openTypedReading({ nest, visit: at, marks });
  expect(await readReading(db, 'tobiah', reading)).toMatchObject({
    source: 'paper',
    kind: 'field',
    mine: true,
    submittedAt: null,
    tally: { cellsTotal: 6, capped: 1, egg: 1, small: 1, large: 1, medium: 1, empty: 1, nectarCells: 1 },
  });
});

test('a typed sheet is kept whole or not at all', async () => {
  const { phone, nest, visit: at } = await visit();
  const { db, commands } = phone.records();
  const before = await db.ops.count();
  await db.meta.clear();
  await expect(commands.openTypedReading({ nest, visit: at, marks })).rejects.toMatchObject({ name: 'NotSavedError' });
  expect(await db.ops.count()).toBe(before);
});
