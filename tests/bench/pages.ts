import setUp from '@/tests/support/e2e-up';
import { type PageScores, pageScores } from './page-scores';

function line([name, ...scores]: readonly (string | number)[]): string {
  return `${String(name).padEnd(10)}${scores.map((score) => String(score).padStart(16)).join('')}`;
}

function table(scores: readonly PageScores[]): string {
  const rows = scores.map(({ name, performance, accessibility, bestPractices }) =>
    line([name, performance, accessibility, bestPractices]),
  );
  return [line(['page', 'performance', 'accessibility', 'best practices']), ...rows].join('\n');
}

// The command has started the database; the demo season and the server come and go with this run.
const tearDown = await setUp();
try {
  process.stdout.write(`Lighthouse, 0 to 100; field as a phone, the others as a desk\n${table(await pageScores())}\n`);
} finally {
  await tearDown();
}
