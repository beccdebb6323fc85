import { fontRules } from './figure-fonts';
import { figureRules, variableRule, variablesIn } from './figure-style';

const SVG = 'http://www.w3.org/2000/svg';
const CAPTION_LINE = 18;
const MARGIN = 12;
/** Room for the caption. */
const LEAST_WIDTH = 580;
/** Pictures of pixels are made this much larger than on the screen, for print. */
const PIXELS = 2;

/** A drawing that stands alone, and its size in CSS pixels. */
export interface FigureFile {
  text: string;
  width: number;
  height: number;
}

function element(name: string, attributes: Readonly<Record<string, string | number>>, text?: string): SVGElement {
  const made = document.createElementNS(SVG, name);
  for (const [key, value] of Object.entries(attributes)) made.setAttribute(key, String(value));
  if (text !== undefined) made.textContent = text;
  return made;
}

/** What only makes sense on the page: the places of keyboard and finger. */
function stripPage(drawing: SVGSVGElement): void {
  for (const mark of drawing.querySelectorAll('.comb-focus, .comb-current')) mark.remove();
  for (const node of [drawing, ...drawing.querySelectorAll('*')]) {
    for (const name of ['tabindex', 'role', 'aria-selected', 'aria-label']) node.removeAttribute(name);
  }
}

/** Copies of the symbols a drawing points to; they live elsewhere in the page. */
function symbolsOf(drawing: SVGSVGElement): SVGElement {
  const defs = element('defs', {});
  const ids = new Set(Array.from(drawing.querySelectorAll('use'), (use) => use.getAttribute('href')?.slice(1) ?? ''));
  for (const id of ids) {
    const symbol = document.getElementById(id);
    if (symbol) defs.append(symbol.cloneNode(true));
  }
  return defs;
}

/** The style of the page that the drawing needs, with its variables and fonts. */
async function styleOf(text: string, shown: Element): Promise<string> {
  const rules = Array.from(document.styleSheets).flatMap((sheet) => figureRules(sheet.cssRules));
  const root = getComputedStyle(document.documentElement);
  const variables = variableRule(variablesIn([text, ...rules].join(' ')), (name) => root.getPropertyValue(name));
  const family = getComputedStyle(shown).fontFamily;
  const mono = root.getPropertyValue('--font-mono');
  const fonts = await fontRules(`${family}, ${mono}`);
  return [...fonts, variables, `svg { font-family: ${family}; }`, ...rules].join('\n');
}

/**
 * A drawing of the page as a file of its own: symbols, style and fonts inside, on white, with its caption below.
 *
 * @param caption lines that say what is shown and what it rests on.
 */
export async function figureFile(shown: SVGSVGElement, caption: readonly string[]): Promise<FigureFile> {
  const box = shown.viewBox.baseVal;
  const scale = shown.width.baseVal.value / box.width || 1;
  const drawing = shown.cloneNode(true) as SVGSVGElement;
  stripPage(drawing);
  const width = Math.max(LEAST_WIDTH, Math.round(box.width * scale)) + 2 * MARGIN;
  const drawn = Math.round(box.height * scale);
  const height = drawn + caption.length * CAPTION_LINE + 2 * MARGIN;
  drawing.setAttribute('x', String(MARGIN));
  drawing.setAttribute('y', String(MARGIN));
  drawing.setAttribute('width', String(Math.round(box.width * scale)));
  drawing.setAttribute('height', String(drawn));
  const file = element('svg', { width, height, viewBox: `0 0 ${width} ${height}` });
  file.append(
    element('title', {}, caption[0] ?? ''),
    symbolsOf(drawing),
    element('rect', { width, height, fill: '#ffffff' }),
    drawing,
    ...caption.map((line, index) =>
      element('text', { x: MARGIN, y: MARGIN + drawn + (index + 0.8) * CAPTION_LINE, 'font-size': 13 }, line),
    ),
  );
  const style = await styleOf(new XMLSerializer().serializeToString(file), shown);
  file.prepend(element('style', {}, style));
  return { text: new XMLSerializer().serializeToString(file), width, height };
}

function loaded(url: string): Promise<HTMLImageElement> {
  return new Promise((resolve, reject) => {
    const image = new Image();
    image.onload = () => resolve(image);
    image.onerror = () => reject(new Error('the drawing could not be turned into pixels'));
    image.src = url;
  });
}

/**
 * The same drawing in pixels.
 *
 * @throws Error when this browser cannot do it.
 */
export async function pngOf({ text, width, height }: FigureFile): Promise<Blob> {
  const url = URL.createObjectURL(new Blob([text], { type: 'image/svg+xml' }));
  try {
    const image = await loaded(url);
    const canvas = document.createElement('canvas');
    [canvas.width, canvas.height] = [width * PIXELS, height * PIXELS];
    canvas.getContext('2d')?.drawImage(image, 0, 0, canvas.width, canvas.height);
    const blob = await new Promise<Blob | null>((resolve) => canvas.toBlob(resolve, 'image/png'));
    if (!blob) throw new Error('no pixels');
    return blob;
  } finally {
    URL.revokeObjectURL(url);
  }
}
