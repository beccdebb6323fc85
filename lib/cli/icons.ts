import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import sharp from 'sharp';

/** One icon file drawn from the mark. */
interface IconFile {
  name: string;
  size: number;
  /** Share of the side the mark takes; a maskable icon keeps it within the safe circle. */
  scale: number;
  /** Corner radius of the white card, in 64ths of the side; 0 where the phone cuts the shape itself. */
  round: number;
}

const ICONS: readonly IconFile[] = [
  { name: 'icon-192.png', size: 192, scale: 0.8, round: 12 },
  { name: 'icon-512.png', size: 512, scale: 0.8, round: 12 },
  { name: 'maskable-512.png', size: 512, scale: 0.66, round: 0 },
  { name: 'apple-180.png', size: 180, scale: 0.72, round: 0 },
  { name: 'shortcut-96.png', size: 96, scale: 0.8, round: 12 },
];
const FOLDER = join('public', 'icons');
/** The mark sits a little low in its square; this lifts it to the optical middle. */
const LIFT = 1.5;

/** What is inside the `<svg>` of the mark. */
function drawingOf(svg: string): string {
  return svg.slice(svg.indexOf('>') + 1, svg.lastIndexOf('</svg>'));
}

function card(drawing: string, { scale, round }: IconFile): string {
  const inset = (64 - 64 * scale) / 2;
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 64 64"><rect width="64" height="64" rx="${round}" fill="#ffffff"/>` +
    `<g transform="translate(${inset} ${inset - LIFT * scale}) scale(${scale})">${drawing}</g></svg>`
  );
}

/** A picture for the browser's install dialogue, cut from one that the browser tests took. */
interface InstallPicture {
  from: string;
  name: string;
  width: number;
  height: number;
  /** How much larger it is drawn than it was taken. */
  scale: number;
}

const TAKEN = join('.artifacts', 'screens');
const PICTURES: readonly InstallPicture[] = [
  { from: 'field-nest-390.png', name: 'comb-narrow.png', width: 390, height: 844, scale: 2 },
  { from: 'field-nests-1280.png', name: 'nests-wide.png', width: 1280, height: 800, scale: 1 },
];

/** The upper part of a taken picture; nothing when the browser tests have not run here. */
async function drawPicture({ from, name, width, height, scale }: InstallPicture): Promise<void> {
  const taken = join(TAKEN, from);
  if (!existsSync(taken)) return;
  const drawn = sharp(taken)
    .extract({ left: 0, top: 0, width, height })
    .resize(width * scale, height * scale);
  mkdirSync(join('public', 'screenshots'), { recursive: true });
  writeFileSync(
    join('public', 'screenshots', name),
    await drawn.png({ compressionLevel: 9, palette: true }).toBuffer(),
  );
}

/** The shape alone, which phones colour themselves. */
async function drawMonochrome(): Promise<void> {
  const shape = drawingOf(readFileSync(join(FOLDER, 'monochrome.svg'), 'utf8'));
  const svg = `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 64 64"><g transform="translate(10.9 10) scale(.66)">${shape}</g></svg>`;
  const drawn = sharp(Buffer.from(svg), { density: 2304 }).resize(512, 512);
  writeFileSync(join(FOLDER, 'monochrome-512.png'), await drawn.png({ compressionLevel: 9 }).toBuffer());
}

/**
 * `npm run icons` draws the icon files anew from `public/icons/mark.svg` and `monochrome.svg`, and the pictures of the
 * install dialogue from those the browser tests took last.
 */
const mark = drawingOf(readFileSync(join(FOLDER, 'mark.svg'), 'utf8'));
for (const icon of ICONS) {
  const drawn = sharp(Buffer.from(card(mark, icon)), { density: (72 * icon.size) / 16 }).resize(icon.size, icon.size);
  writeFileSync(join(FOLDER, icon.name), await drawn.png({ compressionLevel: 9, palette: true }).toBuffer());
}
await drawMonochrome();
for (const picture of PICTURES) await drawPicture(picture);
