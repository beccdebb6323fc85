import 'server-only';
import type { TaxonStory } from '@/lib/server/demo/story/team-story';

/** What hangs under the eaves of the county, and where it stands there. */
export const TARROW_TAXA: readonly TaxonStory[] = [
  { scientificName: 'Polistes fuscatus', status: 'native' },
  { scientificName: 'Polistes fuscatus group', status: 'native' },
  { scientificName: 'Polistes metricus', status: 'native' },
  { scientificName: 'Polistes dominula', status: 'introduced' },
  { scientificName: 'Dolichovespula', status: 'not-polistes' },
];
