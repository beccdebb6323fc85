import { renderToStaticMarkup } from 'react-dom/server';
import { encode } from 'uqr';
import { describe, expect, test } from 'vitest';
import { PaperSheet } from '@/components/field/paper/paper-sheet';
import { QrCode } from '@/components/field/paper/qr-code';
import { faultWords, ringWords } from '@/components/field/paper/sheet-words';

const CODE = 'K7QF-2M9X-RTWB';

describe('the blank sheet', () => {
  const html = renderToStaticMarkup(<PaperSheet code={CODE} nest="N12" />);

  test('has 61 cells with their numbers, from 0 at the pedicel cell', () => {
    const numbers = [...html.matchAll(/<text[^>]*>(\d+)<\/text>/g)].map(([, number]) => Number(number));
    expect(numbers.sort((a, b) => a - b)).toEqual(Array.from({ length: 61 }, (_, n) => n));
  });

  test('bears its code in letters beside the square, and what the square holds is the code alone', () => {
    expect(html).toContain(`>${CODE}</p>`);
    const drawn = renderToStaticMarkup(<QrCode text={CODE} sizeMm={28} />);
    expect(html).toContain(drawn);
    expect(drawn).not.toMatch(/http|N12/);
  });

  test('has no square for a nest that is not in the app yet', () => {
    expect(renderToStaticMarkup(<PaperSheet code={null} nest={null} />)).not.toContain('Square code');
  });
});

test('the square has four modules of white around it and modules of at least 0.4 mm (ISO/IEC 18004; hand distance)', () => {
  const { data, size } = encode(CODE, { ecc: 'Q', border: 4 });
  expect(size).toBe(21 + 8);
  const edge = [0, 1, 2, 3].flatMap((at) => [data[at], data[size - 1 - at]].flat());
  expect(edge).not.toContain(true);
  expect(28 / size).toBeGreaterThanOrEqual(0.4);
  expect((28 * 21) / size).toBeGreaterThanOrEqual(15);
});

test('a line says which cells it is about, and a fault says where', () => {
  expect(ringWords(0)).toBe('Pedicel cell: 0');
  expect(ringWords(2)).toBe('Ring 2: cells 7 to 18');
  expect(faultWords({ ring: 1, cell: 2, text: 'z' })).toBe('Cell 2: the sheet has no letter “z”.');
  expect(faultWords({ ring: 1, cell: null, text: 'c' })).toBe('Ring 1 has no place left for “c”.');
});
