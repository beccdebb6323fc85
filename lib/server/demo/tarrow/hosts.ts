import 'server-only';
import type { HostStory } from '@/lib/server/demo/story/team-story';

/** The four release places of the season. */
export const TARROW_HOSTS: readonly HostStory[] = [
  {
    code: 'H1',
    name: 'Greta Ansby',
    placeName: 'Pellow orchard, ladder loft',
    lat: 43.5785,
    lon: -77.5985,
    capacity: 3,
    note: 'Open ladder shelter. Ants: fit the guard before the nest hangs.',
    withdrawnOn: null,
  },
  {
    code: 'H2',
    name: 'Des Okonjo',
    placeName: 'Marlpit nature yard, tool lean-to',
    lat: 43.6302,
    lon: -77.5702,
    capacity: 3,
    note: 'Lean-to. Withdrew on 3 July; whatever hangs there needs a new place.',
    withdrawnOn: '2026-07-03',
  },
  {
    code: 'H3',
    name: 'Lotte Brandvik',
    placeName: 'Quince Hill allotments, plot 9 shed',
    lat: 43.547,
    lon: -77.512,
    capacity: 2,
    note: 'Shed eave. Birds: hang the nest behind the lattice.',
    withdrawnOn: null,
  },
  {
    code: 'H4',
    name: 'R. Tarn',
    placeName: 'Skelder lock, rain shelter',
    lat: 43.653,
    lon: -77.561,
    capacity: 2,
    note: 'Roof beam. No signal at the lock; the road has some.',
    withdrawnOn: null,
  },
];
