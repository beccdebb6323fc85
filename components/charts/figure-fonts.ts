/** One face of a font as a style sheet names it. */
interface Face {
  family: string;
  weight: string;
  url: string;
}

const URL_OF = /url\(["']?([^"')]+)["']?\)/;

function unquoted(text: string): string {
  return text.trim().replace(/^["']|["']$/g, '');
}

function facesOf(sheet: CSSStyleSheet): Face[] {
  return Array.from(sheet.cssRules).flatMap((rule) => {
    if (!(rule instanceof CSSFontFaceRule)) return [];
    const { style } = rule;
    const [, url] = URL_OF.exec(style.getPropertyValue('src')) ?? [];
    if (!url || style.getPropertyValue('font-style') === 'italic') return [];
    const base = sheet.href ?? document.baseURI;
    const face = {
      family: unquoted(style.getPropertyValue('font-family')),
      weight: style.getPropertyValue('font-weight'),
    };
    return [{ ...face, url: new URL(url, base).href }];
  });
}

async function dataUrl(url: string): Promise<string> {
  const bytes = new Uint8Array(await (await fetch(url)).arrayBuffer());
  const parts: string[] = [];
  for (let at = 0; at < bytes.length; at += 8192) parts.push(String.fromCharCode(...bytes.subarray(at, at + 8192)));
  return `data:font/woff2;base64,${btoa(parts.join(''))}`;
}

async function faceRule({ family, weight, url }: Face): Promise<string> {
  return `@font-face { font-family: "${family}"; font-weight: ${weight}; src: url(${await dataUrl(url)}) format("woff2"); }`;
}

/**
 * The faces of the fonts named in a list of families, each with its file inside, so that a drawing looks the same on a
 * machine without them.
 *
 * @param families as in a style: `next, "next Fallback", sans-serif`.
 */
export async function fontRules(families: string): Promise<string[]> {
  const wanted = new Set(families.split(',').map(unquoted));
  const faces = Array.from(document.styleSheets).flatMap(facesOf);
  return Promise.all(faces.filter(({ family }) => wanted.has(family)).map(faceRule));
}
