import { expect, test } from 'vitest';
import { endChild, hasEnded, runChild, startChild } from '@/lib/cli/child';
import { Stopped } from '@/lib/cli/command-error';
import { processMark } from '@/lib/cli/pid-lock.mjs';

const node = (script: string) => ({ command: process.execPath, args: ['-e', script] });

test('what a program writes and how it ends is handed on', async () => {
  const script = "console.log('out'); console.error('err'); process.exit(3)";
  const { code, output } = await runChild({ ...node(script), output: 'keep' });
  expect(code).toBe(3);
  expect(output.split('\n').sort()).toEqual(['', 'err', 'out']);
});

test('a program that does not exist is an error, not a hang', async () => {
  await expect(runChild({ command: './no-such-program', args: [], output: 'keep' })).rejects.toThrow(/ENOENT/);
});

test('a stop ends the program and everything it started, and says so', async () => {
  const controller = new AbortController();
  const script = `
    const { spawn } = require('node:child_process');
    const grandchild = spawn(process.execPath, ['-e', 'setInterval(() => {}, 1000)']);
    console.log(grandchild.pid);
    setInterval(() => {}, 1000);`;
  const child = startChild({ ...node(script), output: 'keep' });
  const grandchild = await new Promise<number>((resolve) =>
    child.stdout?.once('data', (chunk: Buffer) => resolve(Number(chunk))),
  );
  await endChild(child);
  expect(hasEnded(child)).toBe(true);
  await expect.poll(() => processMark(grandchild)).toBeNull();
  controller.abort();
  await expect(runChild({ ...node('1'), output: 'keep', signal: controller.signal })).rejects.toThrow(Stopped);
});

test('a running program is ended when the signal comes', async () => {
  const controller = new AbortController();
  const running = runChild({ ...node('setInterval(() => {}, 1000)'), output: 'keep', signal: controller.signal });
  setTimeout(() => controller.abort(), 200);
  await expect(running).rejects.toThrow(Stopped);
});
