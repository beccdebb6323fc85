import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';

const CSS = readFileSync('app/globals.css', 'utf8');

/** The colour tokens of the first rule with this selector. */
function tokensOf(selector: string): Record<string, string> {
  const from = CSS.indexOf(`${selector} {`);
  const rule = CSS.slice(from, CSS.indexOf('}', from));
  return Object.fromEntries(
    [...rule.matchAll(/--([a-z-]+): (#[0-9a-f]{6});/g)].map(([, name, value]) => [name, value]),
  );
}

function channels(colour: string): [number, number, number] {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((at) => Number.parseInt(colour.slice(at, at + 2), 16));
  return [red, green, blue];
}

/** Relative luminance of an sRGB colour (WCAG 2.2, definition of relative luminance). */
function luminance(colour: string): number {
  const [red, green, blue] = channels(colour).map((value) => {
    const share = value / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * (red ?? 0) + 0.7152 * (green ?? 0) + 0.0722 * (blue ?? 0);
}

/** Contrast ratio of two colours (WCAG 2.2). */
function contrast(a: string, b: string): number {
  const [dark = 0, light = 0] = [luminance(a), luminance(b)].sort((x, y) => x - y);
  return (light + 0.05) / (dark + 0.05);
}

const TEXTS = ['ink', 'quiet', 'main', 'stop', 'warn'];
const GROUNDS = ['paper', 'wash', 'main-wash', 'stop-wash', 'warn-wash'];
const FILLS = ['stage-egg', 'stage-small', 'stage-medium', 'stage-large', 'stage-capped'];

const day = tokensOf(':root');
const low = tokensOf("[data-lamp='low']");
const of = (tokens: Record<string, string>, name: string) => tokens[name] ?? '#ff00ff';

test('the ratio is the one of the standard: black on white 21, the product’s ink on paper 17.9', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 5);
  expect(contrast('#15171c', '#ffffff')).toBeCloseTo(17.9, 1);
});

describe('by low lamp', () => {
  test('every colour of the day has one of its own', () => {
    expect(Object.keys(low).sort()).toEqual(Object.keys(day).sort());
  });

  test.each(TEXTS)('text in %s is at least 7:1 on every ground', (text) => {
    for (const ground of GROUNDS) expect(contrast(of(low, text), of(low, ground)), ground).toBeGreaterThanOrEqual(7);
  });

  test.each(FILLS)('the glyph on %s is at least 7:1', (fill) => {
    expect(contrast(of(low, 'ink'), of(low, fill))).toBeGreaterThanOrEqual(7);
    expect(contrast(of(low, 'glyph-on-dark'), of(low, fill))).toBeGreaterThanOrEqual(7);
  });

  test.each(['main', 'stop', 'ink'])('text on a key filled with %s is at least 7:1', (fill) => {
    expect(contrast(of(low, 'paper'), of(low, fill))).toBeGreaterThanOrEqual(7);
  });

  test('edges of what one presses are at least 3:1 (WCAG 2.2, 1.4.11)', () => {
    expect(contrast(of(low, 'edge'), of(low, 'paper'))).toBeGreaterThanOrEqual(3);
  });

  test('nothing holds red, nothing holds more than half as much blue as green, and nothing is as bright as a day’s page', () => {
    for (const [name, colour] of Object.entries(low)) {
      const [red, green, blue] = channels(colour);
      expect(red, name).toBe(0);
      expect(blue, name).toBeLessThanOrEqual(green / 2);
      expect(luminance(colour), name).toBeLessThan(0.55);
    }
  });
});

test.each(TEXTS)('by day, text in %s is at least 7:1 on paper', (text) => {
  expect(contrast(of(day, text), of(day, 'paper'))).toBeGreaterThanOrEqual(7);
});
