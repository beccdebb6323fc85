/** Thirty-two signs that a hand cannot mix up: no 0 and O, no 1 and I. */
const SIGNS = '23456789ABCDEFGHJKLMNPQRSTUVWXYZ';

const GROUPS = 3;
const PER_GROUP = 4;
/** Signs in a code, without the gaps. */
export const CODE_LENGTH = GROUPS * PER_GROUP;

const BITS = BigInt(5 * CODE_LENGTH);

/**
 * The code on paper for a UUID: its last 60 bits, which chance has made, as `K7QF-2M9X-RTWB`. It tells nothing about
 * what it stands for, and two of one team are alike once in 10¹⁸ pairs.
 *
 * @param id lower-case UUID text.
 */
export function sheetCode(id: string): string {
  let rest = BigInt(`0x${id.replaceAll('-', '')}`) & ((1n << BITS) - 1n);
  let signs = '';
  for (let left = CODE_LENGTH; left > 0; left--) {
    signs = (SIGNS[Number(rest & 31n)] ?? '') + signs;
    rest >>= 5n;
  }
  return [signs.slice(0, 4), signs.slice(4, 8), signs.slice(8)].join('-');
}

/** Typed text with small letters and gaps as a code has them: what is compared with `sheetCode`. */
export function plainCode(text: string): string {
  return text.toUpperCase().replace(/[^0-9A-Z]/g, '');
}
