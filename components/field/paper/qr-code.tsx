import type { ReactElement } from 'react';
import { encode } from 'uqr';

/** Modules of white around the code that a reader needs (ISO/IEC 18004: four). */
const QUIET = 4;

interface QrCodeProps {
  /** Short text in capitals; it is also printed in letters beside the code. */
  text: string;
  /** Side with the white around it, in millimetres. */
  sizeMm: number;
}

/** A square code in black on white, with a quarter of it recoverable: paper gets wet. */
export function QrCode({ text, sizeMm }: QrCodeProps): ReactElement {
  const { data, size } = encode(text, { ecc: 'Q', border: QUIET });
  const path = data.flatMap((row, y) => row.flatMap((dark, x) => (dark ? [`M${x} ${y}h1v1h-1z`] : []))).join('');
  return (
    <svg
      role="img"
      aria-label={`Square code ${text}`}
      width={`${sizeMm}mm`}
      height={`${sizeMm}mm`}
      viewBox={`0 0 ${size} ${size}`}
      shapeRendering="crispEdges"
    >
      <rect width={size} height={size} fill="#ffffff" />
      <path d={path} fill="#000000" />
    </svg>
  );
}
