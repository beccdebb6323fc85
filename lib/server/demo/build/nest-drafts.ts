import 'server-only';
import type { ActStory, NestStory, VisitStory } from '@/lib/server/demo/story/nest-story';
import type { Person } from '@/lib/server/demo/story/person';
import { demoId } from './demo-id';
import { instantOf, isoWithOffset } from './demo-time';
import { type Draft, actDelay, openingDelay, opId, sentAt } from './draft';
import { nestName, readingName, visitName } from './names';
import { readingDrafts } from './reading-drafts';

/** What acts are recorded on. */
interface ActPlace {
  name: string;
  nest: string;
  visit: string | null;
  by: Person;
  offset: string;
  heldMs: number | null;
}

function actDrafts(acts: readonly ActStory[], place: ActPlace): Draft[] {
  const { name, nest, visit, offset, heldMs } = place;
  return acts.map(({ at, kind, body, by = place.by }, i) => {
    const label = `act/${i}`;
    const atMs = instantOf(at, offset) + actDelay(`${name}/${label}`);
    return {
      opId: opId(name, label),
      by,
      atMs,
      sentMs: sentAt(atMs, heldMs),
      kind,
      nest,
      visit,
      reading: null,
      deps: [],
      body,
    };
  });
}

function visitDrafts(visit: VisitStory, nest: NestStory, offset: string): Draft[] {
  const name = visitName(nest, visit);
  const heldMs = visit.heldUntil ? instantOf(visit.heldUntil, offset) : null;
  const nestId = demoId(nestName(nest));
  const visitId = demoId(name);
  const startedMs = instantOf(visit.startedAt, offset);
  const atMs = startedMs + openingDelay(name);
  const open: Draft = {
    opId: opId(name, 'open'),
    by: visit.by,
    atMs,
    sentMs: sentAt(atMs, heldMs),
    kind: 'visit.open',
    nest: nestId,
    visit: visitId,
    reading: null,
    deps: [opId(nestName(nest), 'open')],
    body: { purpose: visit.purpose, startedAt: isoWithOffset(startedMs, offset) },
  };
  const readings = visit.readings.flatMap((reading) =>
    readingDrafts(reading, {
      name: readingName(nest, visit, reading),
      nest: nestId,
      visit: visitId,
      visitOp: open.opId,
      offset,
      heldMs,
    }),
  );
  return [
    open,
    ...actDrafts(visit.acts, { name, nest: nestId, visit: visitId, by: visit.by, offset, heldMs }),
    ...readings,
  ];
}

function openDraft(nest: NestStory, offset: string): Draft {
  const { code, name, taxon, place, openedBy } = nest;
  const atMs = instantOf(nest.openedAt, offset) + openingDelay(nestName(nest));
  return {
    opId: opId(nestName(nest), 'open'),
    by: openedBy,
    atMs,
    sentMs: sentAt(atMs, null),
    kind: 'nest.open',
    nest: demoId(nestName(nest)),
    visit: null,
    reading: null,
    deps: [],
    body: { code, name, taxon, ...(place ? { place: { ...place } } : {}) },
  };
}

/** Every operation about one nest, whoever recorded it. */
export function nestDrafts(nest: NestStory, offset: string): Draft[] {
  const name = nestName(nest);
  const place: ActPlace = { name, nest: demoId(name), visit: null, by: nest.openedBy, offset, heldMs: null };
  return [
    openDraft(nest, offset),
    ...actDrafts(nest.acts, place),
    ...nest.visits.flatMap((visit) => visitDrafts(visit, nest, offset)),
  ];
}
