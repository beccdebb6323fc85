import 'server-only';
import { type LocalDateRange, instantRange } from './local-date-range';

/** Which nests are asked for; every member narrows. */
export interface NestFilter extends LocalDateRange {
  /** Part of code, name or taxon, in any case. */
  q?: string;
  /** The whole code, byte by byte. */
  code?: string;
  /** The whole scientific name. */
  taxon?: string;
}

/** A written condition and the values it names. */
export interface SqlCondition {
  sql: string;
  values: Record<string, string | Date>;
}

/** Text inside a LIKE pattern with its wildcards made plain; `!` is the escape character. */
function likePart(text: string): string {
  return text.replace(/[!%_]/g, '!$&');
}

const LIKE = "COLLATE utf8mb4_unicode_ci LIKE :q ESCAPE '!'";

/** That a visit `v` began on one of the local dates; null when any date will do. */
function visitDateCondition(range: LocalDateRange, zone: string): SqlCondition | null {
  const { from, before } = instantRange(range, zone);
  const sql = [...(from ? ['v.started_at >= :from'] : []), ...(before ? ['v.started_at < :before'] : [])].join(' AND ');
  if (sql === '') return null;
  return { sql, values: { ...(from && { from }), ...(before && { before }) } };
}

/**
 * The condition on a nest `n` that a filter makes, its team included. Dates ask for a visit on one of them.
 *
 * @returns SQL that also needs the value `team`.
 */
export function nestCondition(filter: NestFilter, zone: string): SqlCondition {
  const parts = ['n.team_id = :team'];
  const values: SqlCondition['values'] = {};
  if (filter.q) {
    parts.push(`(n.code ${LIKE} OR n.name ${LIKE} OR n.taxon ${LIKE})`);
    values.q = `%${likePart(filter.q)}%`;
  }
  if (filter.code !== undefined) {
    // The first half uses the index, the second tells trailing spaces apart.
    parts.push('n.code = :code AND BINARY n.code = BINARY :code');
    values.code = filter.code;
  }
  if (filter.taxon !== undefined) {
    parts.push('BINARY n.taxon = BINARY :taxon');
    values.taxon = filter.taxon;
  }
  const dates = visitDateCondition(filter, zone);
  if (dates) {
    parts.push(`EXISTS (SELECT 1 FROM visits v WHERE v.team_id = :team AND v.nest_id = n.id AND ${dates.sql})`);
    Object.assign(values, dates.values);
  }
  return { sql: parts.join(' AND '), values };
}
