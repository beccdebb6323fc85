import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { cellSizeFor } from '@/components/lab/cell-size';
import { decisionHistory } from '@/components/lab/decision-history';
import { nestLine, placeWords, pointWords, readingStanding } from '@/components/lab/lab-words';
import { readingCells } from '@/components/lab/reading-cells';
import { TaxonName } from '@/components/lab/taxon-name';
import { spiral } from '@/lib/comb/walk';

describe('a place in words', () => {
  it('says the accuracy of an exact place', () => {
    expect(placeWords({ lat: 43.598, lon: -77.605, accuracyM: 7.6 }, false)).toBe(
      '43.59800° N, 77.60500° W, within 8 metres',
    );
    expect(placeWords({ lat: 43.598, lon: -77.605, accuracyM: null }, false)).toContain('accuracy not recorded');
  });

  it('says that a rounded place is a square, with no more digits than that', () => {
    expect(placeWords({ lat: 43.59, lon: -77.61, accuracyM: null }, true)).toBe(
      '43.59° N, 77.61° W: the grid square of about 1 km it lies in',
    );
  });

  it('knows the other hemispheres', () => {
    expect(pointWords({ lat: -12, lon: 45 }, false)).toBe('12.00000° S, 45.00000° E');
  });
});

describe('names', () => {
  it('sets the scientific name in italics and the word group upright', () => {
    expect(renderToStaticMarkup(<TaxonName>Polistes fuscatus group</TaxonName>)).toContain(
      '<i>Polistes fuscatus</i> group',
    );
    expect(renderToStaticMarkup(<TaxonName>{null}</TaxonName>)).toContain('not named yet');
  });

  it('says a nest with and without a name', () => {
    expect(nestLine({ code: 'N12', name: 'Bandstand roof' })).toBe('N12 Bandstand roof');
    expect(nestLine({ code: 'N12', name: null })).toBe('N12');
  });

  it('says how far a reading is', () => {
    expect(readingStanding({ submittedAt: null, lockedVersion: null })).toBe('still open');
    expect(readingStanding({ submittedAt: '2026-06-16T10:00:00Z', lockedVersion: null })).toBe('handed in');
    expect(readingStanding({ submittedAt: '2026-06-16T10:00:00Z', lockedVersion: 2 })).toBe('locked, version 2');
  });
});

describe('the cells of a reading', () => {
  const mark = { q: 0, r: 2, state: 'large', instar: null, nectar: false, unsure: true, reused: false, scrap: false };

  it('bear the marks of the observer and of the reviewer', () => {
    const settlement = { q: 0, r: 2, state: 'large', reason: 'face', actor: 'H', at: '', version: 1 } as const;
    const [cell] = readingCells([{ ...mark, note: 'x', at: null }], [settlement]);
    expect(cell).toMatchObject({ state: 'large', unsure: true, noted: true, changed: true });
  });

  it('show a state unknown here as unread', () => {
    expect(readingCells([{ ...mark, state: 'moulting', note: null, at: null }])[0]?.state).toBe('unread');
  });

  it('get the room the column has, between 20 and 60 pixels', () => {
    expect(cellSizeFor(spiral(1), 448)).toBe(60);
    expect(cellSizeFor(spiral(500), 448)).toBe(20);
    expect(cellSizeFor(spiral(61), 448)).toBe(Math.round(448 / 9.4));
  });
});

describe('the history of a final reading', () => {
  it('runs from the newest decision to the oldest', () => {
    const settlement = {
      q: 0,
      r: 0,
      state: 'egg',
      reason: 'a',
      actor: 'H',
      at: '2026-06-20T10:00:00Z',
      version: 1,
    } as const;
    const amendment = { version: 2, reason: 'b', actor: 'L', at: '2026-07-02T10:00:00Z' };
    expect(decisionHistory({ settlements: [settlement], amendments: [amendment] }).map(({ kind }) => kind)).toEqual([
      'amended',
      'settled',
    ]);
  });
});
