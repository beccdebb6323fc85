import { readFileSync, writeFileSync } from 'node:fs';
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

/** `npm run icons` draws the icon files anew from `public/icons/mark.svg`. */
const mark = drawingOf(readFileSync(join(FOLDER, 'mark.svg'), 'utf8'));
for (const icon of ICONS) {
  const drawn = sharp(Buffer.from(card(mark, icon)), { density: (72 * icon.size) / 16 }).resize(icon.size, icon.size);
  writeFileSync(join(FOLDER, icon.name), await drawn.png({ compressionLevel: 9, palette: true }).toBuffer());
}
