import 'server-only';
import type { NestStory } from './nest-story';
import type { Person } from './person';

/** A named kind and its status where the team works. */
export interface TaxonStory {
  scientificName: string;
  status: 'native' | 'introduced' | 'not-polistes';
}

/** A person who offers a release place. */
export interface HostStory {
  code: string;
  name: string;
  placeName: string;
  lat: number;
  lon: number;
  /** Nests there is room for. */
  capacity: number;
  note: string | null;
  /** `YYYY-MM-DD`, or null while the offer stands. */
  withdrawnOn: string | null;
}

/** One team with everything it holds. */
export interface TeamStory {
  /** Names the team in ids. */
  key: string;
  name: string;
  /** IANA zone. */
  zone: string;
  /** The zone's offset during the whole season. */
  offset: string;
  home: { lat: number; lon: number };
  people: readonly Person[];
  /** Signs settings version 1; null for a team that still runs on the unsigned defaults. */
  settingsSignedBy: Person | null;
  taxa: readonly TaxonStory[];
  hosts: readonly HostStory[];
  nests: readonly NestStory[];
}
