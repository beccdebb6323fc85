import 'server-only';
import type { TeamStory } from '@/lib/server/demo/story/team-story';
import { O01 } from './nests/o01';
import { O02 } from './nests/o02';
import { O03 } from './nests/o03';
import { OSSLE_PEOPLE } from './people';

/** A second, unrelated team on the same server. It must never see the first, nor be seen by it. */
export const OSSLE: TeamStory = {
  key: 'ossle',
  name: 'Ossle Saltmarsh Wasp Circle',
  zone: 'Europe/Paris',
  offset: '+02:00',
  home: { lat: 42.7, lon: 4.1 },
  people: OSSLE_PEOPLE,
  settingsSignedBy: null,
  taxa: [
    { scientificName: 'Polistes dominula', status: 'native' },
    { scientificName: 'Polistes gallicus', status: 'native' },
  ],
  hosts: [
    {
      code: 'H1',
      name: 'Aurel Vantongeren',
      placeName: 'Pump house, seaward wall',
      lat: 42.731,
      lon: 4.171,
      capacity: 2,
      note: null,
      withdrawnOn: null,
    },
  ],
  nests: [O01, O02, O03],
};
