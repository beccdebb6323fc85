import type { Axial } from './axial';

/** A point on the comb drawing, in units of the drawing. */
export interface Point {
  x: number;
  y: number;
}

/**
 * The centre of a cell on the drawing, pointy-top, with the pedicel cell at (0, 0).
 *
 * @param pitch flat-to-flat width of a cell, the distance between neighbouring centres.
 */
export function cellCentre({ q, r }: Axial, pitch: number): Point {
  return { x: pitch * (q + r / 2), y: pitch * (Math.sqrt(3) / 2) * r };
}

/** Side (and circumradius) of a regular cell of flat-to-flat width `pitch`: p / √3. */
export function cellSide(pitch: number): number {
  return pitch / Math.sqrt(3);
}

/** Area of a regular cell of flat-to-flat width `pitch`: (√3 / 2) p². */
export function cellArea(pitch: number): number {
  return (Math.sqrt(3) / 2) * pitch * pitch;
}
