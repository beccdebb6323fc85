import type { TeamAudit } from '@/lib/server/audit/check-teams';

/** What the command was asked for. */
export interface AuditOptions {
  /** Heads noted earlier, lower-case hex. */
  heads: string[];
}

/** What to print, and whether all is well. */
export interface AuditReport {
  lines: string[];
  holds: boolean;
}

const HASH = /^[0-9a-f]{64}$/;
/** Faults named for each team; the rest is counted. */
const NAMED = 5;

/** Reads `--head HASH`, any number of times; null for anything else. */
export function auditOptions(args: readonly string[]): AuditOptions | null {
  const heads: string[] = [];
  for (let at = 0; at < args.length; at += 2) {
    const hash = args[at + 1]?.toLowerCase() ?? '';
    if (args[at] !== '--head' || !HASH.test(hash)) return null;
    heads.push(hash);
  }
  return { heads };
}

function faultLines({ faults }: TeamAudit): string[] {
  const named = faults
    .slice(0, NAMED)
    .map(({ seq, found }) => `  ${seq === null ? 'no entry' : `entry ${seq}`}: ${found}`);
  const more = faults.length - named.length;
  return [...named, ...(more > 0 ? [`  and ${more} more`] : [])];
}

function teamLines(audit: TeamAudit): string[] {
  const { team, entries, finals, settlements, head, faults } = audit;
  const size = `${entries} entries, ${finals} final readings, ${settlements} decisions`;
  if (faults.length > 0) return [`${team}: BROKEN (${size}); first broken link:`, ...faultLines(audit)];
  return [`${team}: unbroken (${size})`, `  head ${head}`];
}

/** The report of a check: one block a team, the first broken link first, and the noted heads nobody knows. */
export function auditLines(audits: readonly TeamAudit[], heads: readonly string[]): AuditReport {
  const unknown = heads.filter((head) => !audits.some(({ known }) => known.includes(head)));
  const lines = audits.flatMap(teamLines);
  for (const head of unknown) lines.push(`BROKEN: the noted head ${head} is no link of any chain`);
  if (audits.length === 0) lines.push('There is no team here, so there is nothing to check.');
  return { lines, holds: unknown.length === 0 && audits.every(({ faults }) => faults.length === 0) };
}
