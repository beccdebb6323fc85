import 'server-only';
import type { TeamStory } from '@/lib/server/demo/story/team-story';
import { TARROW_HOSTS } from './hosts';
import { N01 } from './nests/n01';
import { N02 } from './nests/n02';
import { N03 } from './nests/n03';
import { N04 } from './nests/n04';
import { N05 } from './nests/n05';
import { N06 } from './nests/n06';
import { N07 } from './nests/n07';
import { N08 } from './nests/n08';
import { N09 } from './nests/n09';
import { N10 } from './nests/n10';
import { N11 } from './nests/n11';
import { N12 } from './nests/n12';
import { LOOS, TARROW_PEOPLE } from './people';
import { TARROW_TAXA } from './taxa';

/** The Quillard Field Room's season 2026. Every person and place is invented; every coordinate lies in open water. */
export const TARROW: TeamStory = {
  key: 'tarrow',
  name: 'Tarrow County Underhang Trust',
  zone: 'America/New_York',
  offset: '-04:00',
  home: { lat: 43.6, lon: -77.6 },
  people: TARROW_PEOPLE,
  settingsSignedBy: LOOS,
  taxa: TARROW_TAXA,
  hosts: TARROW_HOSTS,
  nests: [N01, N02, N03, N04, N05, N06, N07, N08, N09, N10, N11, N12],
};
