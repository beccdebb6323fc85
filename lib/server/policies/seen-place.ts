import 'server-only';
import type { Role } from '@/lib/server/auth/role';

/** A place as stored or shown; degrees WGS 84, accuracy in metres. */
export interface SeenPlace {
  lat: number;
  lon: number;
  accuracyM: number | null;
}

/** Cells of the grid per degree that rounded places are shown on: 0.01°, about 1.1 km north to south. */
const GRID_PER_DEGREE = 100;

/** Is this role shown the exact place of a nest? Researchers see its grid cell. */
function seesExactPlaces(role: Role): boolean {
  return role !== 'researcher';
}

/** A coordinate moved down to its grid line, so that asking again never narrows it. */
function toGrid(degrees: number): number {
  return Math.floor(Math.round(degrees * GRID_PER_DEGREE * 1e7) / 1e7) / GRID_PER_DEGREE;
}

/** The place as a role may see it: exact, or the south-west corner of its grid cell without an accuracy. */
export function seenPlace(role: Role, place: SeenPlace | null): SeenPlace | null {
  if (!place || seesExactPlaces(role)) return place;
  return { lat: toGrid(place.lat), lon: toGrid(place.lon), accuracyM: null };
}
