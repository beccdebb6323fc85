import { type DayScale, percentOf } from './day-scale';

/** Where things go in a chart of days that is `width` pixels wide, with room for labels at its left. */
export interface Plot {
  scale: DayScale;
  width: number;
  /** Where the days begin. */
  left: number;
  /** How many labels the axis has room for. */
  ticks: number;
  /** Where a date lies. */
  x: (date: string) => number;
}

/** Below this width a chart is on a phone. */
const NARROW_PX = 560;
const TICK_PX = 90;
const RIGHT_PX = 8;

/** Room for the labels of rows at this width. */
export function labelRoom(width: number): number {
  return width < NARROW_PX ? 92 : 150;
}

/** Lays out a chart. Places are rounded to a tenth of a pixel, so that markup stays short. */
export function plotOf(scale: DayScale, width: number, left: number): Plot {
  const room = Math.max(1, width - left - RIGHT_PX);
  return {
    scale,
    width,
    left,
    ticks: Math.max(2, Math.min(8, Math.floor(room / TICK_PX))),
    x: (date) => Math.round((left + (percentOf(scale, date) / 100) * room) * 10) / 10,
  };
}
