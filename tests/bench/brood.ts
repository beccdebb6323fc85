import { spawnSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { parseArgs } from 'node:util';
import { type Measured, type Point, measure } from './brood-point';

/** One row of growth: what grows, and a point for each of its values. */
interface Growth {
  name: string;
  sizes: readonly number[];
  point: (size: number) => Point;
}

const NODES = 7;
const nest = (rest: Partial<Point>): Point => ({
  ...{ kind: 'nest', cells: 40, visits: 20, gap: 3, isEveryCellUnique: true, runs: 1 },
  ...rest,
});

/** Sizes from small to large; the short form leaves the large ones out. */
function growths(isShort: boolean): Growth[] {
  const upTo = (sizes: readonly number[], most: number) => sizes.filter((size) => !isShort || size <= most);
  return [
    {
      name: 'unique histories (20 visits, 3 days apart)',
      sizes: upTo([10, 40, 100, 200, 500], 100),
      point: (cells) => nest({ cells }),
    },
    {
      name: 'cells (6 visits, 7 days apart; equal cells at one distance share their work)',
      sizes: upTo([50, 200, 500, 1_000, 2_000], 200),
      point: (cells) => nest({ cells, visits: 6, gap: 7, isEveryCellUnique: false }),
    },
    {
      name: 'visits (40 cells, all within 39 days)',
      sizes: upTo([2, 5, 10, 20, 40], 20),
      point: (visits) => nest({ visits, gap: 39 / (visits - 1), runs: 2 }),
    },
  ];
}

/** Measures a point in a process of its own, so that time and memory are those of this point alone. */
function measured(point: Point): Measured {
  const self = fileURLToPath(import.meta.url);
  const { stdout, status } = spawnSync(
    process.execPath,
    [...process.execArgv, self, '--point', JSON.stringify(point)],
    {
      stdio: ['ignore', 'pipe', 'inherit'],
      encoding: 'utf8',
    },
  );
  if (status !== 0) throw new Error(`the point ${JSON.stringify(point)} ended with code ${status}`);
  return JSON.parse(stdout) as Measured;
}

const say = (line: string) => process.stdout.write(`${line}\n`);

/** Slope of log seconds on log size: 1 when twice as much takes twice as long. */
function exponent(points: readonly { size: number; cpu: number }[]): number {
  const logs = points.map(({ size, cpu }) => ({ x: Math.log(size), y: Math.log(cpu) }));
  const mean = (pick: (point: { x: number; y: number }) => number) =>
    logs.reduce((sum, point) => sum + pick(point), 0) / logs.length;
  const [x, y] = [mean((point) => point.x), mean((point) => point.y)];
  return mean((point) => (point.x - x) * (point.y - y)) / mean((point) => (point.x - x) ** 2);
}

function time({ seconds, cpu }: Measured): string {
  return `${cpu.toFixed(3).padStart(8)} s of processor, ${seconds.toFixed(3)} s by the clock`;
}

function memory({ rssBefore, rssPeak, heap }: Measured): string {
  return `resident ${rssPeak.toFixed(0)} MB at most (${rssBefore.toFixed(0)} before), heap ${heap.toFixed(0)} MB after`;
}

function sayGrowth({ name, sizes, point }: Growth): void {
  say(`\nGrowth with ${name}`);
  const points = sizes.map((size) => {
    const found = measured(point(size));
    say(`${String(size).padStart(7)} ${time(found)}; ${found.unique} unique; ${memory(found)}`);
    return { size, cpu: found.cpu };
  });
  say(`  exponent ${exponent(points).toFixed(2)}, over its upper half ${exponent(points.slice(-3)).toFixed(2)}`);
}

function sayCase(name: string, point: Point): Measured {
  const found = measured(point);
  say(`${name}: ${time(found).trim()}; ${found.unique} unique; ${memory(found)}`);
  return found;
}

/** The core and the dense implementation on the same records, and the whole model's node beside them. */
function sayRatio(cells: number): void {
  const core = measured(nest({ kind: 'core', cells }));
  const { dense } = core;
  if (!dense) return;
  say(`\n${core.unique} records x 20 visits, ${dense.states} states, one node, one process (seconds of processor)`);
  say(`  core   ${core.cpu.toFixed(3)} s; ${memory(core)}`);
  say(`  dense  ${dense.cpu.toFixed(3)} s; matrices of every gap made once; laying by trapezia of a quarter day`);
  say(`  core / dense ${(core.cpu / dense.cpu).toFixed(2)}`);
  say(
    `  apart by ${dense.logLikGap.toExponential(1)} in log-likelihood, ${dense.lawGap.toExponential(1)} in laying laws`,
  );
  const whole = sayCase('  whole nest model on as many cells, 7 nodes', nest({ cells }));
  say(`  nest model per node / dense ${(whole.cpu / NODES / dense.cpu).toFixed(2)}`);
}

/** Prints all figures. */
function bench(isShort: boolean): void {
  say(
    `Brood model, Node ${process.versions.node}, one core; every line in a process of its own${isShort ? '; short form' : ''}`,
  );
  sayCase('40 histories x 20 visits x 7 nodes', nest({ runs: 3 }));
  sayCase('one reading of 60 cells', nest({ cells: 60, visits: 1, isEveryCellUnique: false, runs: 5 }));
  sayRatio(isShort ? 60 : 500);
  for (const growth of growths(isShort)) sayGrowth(growth);
}

const { values } = parseArgs({ options: { short: { type: 'boolean', default: false }, point: { type: 'string' } } });
if (values.point === undefined) bench(values.short);
else process.stdout.write(JSON.stringify(measure(JSON.parse(values.point) as Point)));
