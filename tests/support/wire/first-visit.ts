import { v7 } from 'uuid';
import type { Json } from '@/lib/protocol/canonical-json';
import type { Op } from '@/lib/protocol/op';
import { wireOp } from './wire-op';

/** The ids of one nest with one visit and one reading. */
export interface VisitIds {
  nest: string;
  visit: string;
  reading: string;
}

/** Fresh ids for a nest, a visit and a reading. */
export function freshIds(): VisitIds {
  return { nest: v7(), visit: v7(), reading: v7() };
}

/** The three operations that open a nest, a visit and a field reading. */
export function openingOps(ids: VisitIds, code: string, startedAt = '2026-06-16T05:35:00-04:00'): Op[] {
  return [
    wireOp({ kind: 'nest.open', nest: ids.nest, body: { code, name: `${code} roof`, taxon: 'Polistes fuscatus' } }),
    wireOp({ kind: 'visit.open', nest: ids.nest, visit: ids.visit, body: { purpose: 'take-down', startedAt } }),
    wireOp({ kind: 'reading.open', ...ids, body: { kind: 'field', source: 'phone' } }),
  ];
}

/** One mark of a reading. */
export function markOp(ids: VisitIds, cell: { q: number; r: number; state: string } & Record<string, Json>): Op {
  return wireOp({ kind: 'cell.mark', ...ids, body: { nectar: false, unsure: false, ...cell } });
}
