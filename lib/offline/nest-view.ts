import type { Mark } from '@/lib/comb/mark';
import type { Tally } from '@/lib/comb/tally';
import type { Json } from '@/lib/protocol/canonical-json';

/** A place as recorded; accuracy in metres when the phone knew it. */
export interface Place {
  lat: number;
  lon: number;
  accuracyM: number | null;
}

/** How far one record has come: only on this phone, at the office, or in need of a person. */
export type Standing = 'waiting' | 'at-office' | 'not-accepted';

/** One field of an entity: its winning value, and the other value when two people changed it apart. */
export interface FieldView {
  value: Json;
  /** The operation that set it; an edit names it as its base. */
  opId: string;
  others: { value: Json; opId: string }[];
}

/** A nest in the list. */
export interface NestSummary {
  id: string;
  code: string;
  name: string | null;
  taxon: string | null;
  place: Place | null;
  /** ISO 8601 with offset, as written on the phone that opened it. */
  openedAt: string;
  visits: number;
  /** `startedAt` of the latest visit. */
  lastVisitAt: string | null;
  /** The latest opened reading, for a small comb or tally. */
  lastReadingId: string | null;
  archived: boolean;
  standing: Standing;
  /** Operations about this nest that are not at the office yet. */
  waiting: number;
}

/** One nest with its visits, oldest first. */
export interface NestView extends NestSummary {
  fields: ReadonlyMap<string, FieldView>;
  note: FieldView | null;
  visitList: VisitView[];
}

/** One visit with its readings, oldest first. */
export interface VisitView {
  id: string;
  nest: string;
  purpose: 'take-down' | 'check' | 'lab' | 'other';
  startedAt: string;
  /** User id of the person who opened it. */
  observer: string;
  fields: ReadonlyMap<string, FieldView>;
  note: FieldView | null;
  readings: ReadingSummary[];
  standing: Standing;
}

/** One reading without its marks. */
export interface ReadingSummary {
  id: string;
  nest: string;
  visit: string;
  kind: 'field' | 'second';
  source: 'phone' | 'paper' | 'photo';
  /** User id of the person who opened it; only they may mark in it. */
  observer: string;
  mine: boolean;
  openedAt: string;
  submittedAt: string | null;
  /** Set when this person's own unsubmitted second reading of the visit hides it. */
  blind: boolean;
  standing: Standing;
}

/** One live mark and how far it has come. */
export interface MarkView extends Mark {
  standing: Standing;
}

/** One reading with its live marks in walk order. Marks and tally are empty when `blind`. */
export interface ReadingView extends ReadingSummary {
  marks: MarkView[];
  tally: Tally;
  /** This person's own marks and retractions, newest first, in words. */
  history: { opId: string; words: string; at: string }[];
}
