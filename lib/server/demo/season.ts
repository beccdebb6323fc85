import 'server-only';
import { OSSLE } from './ossle/ossle';
import type { TeamStory } from './story/team-story';
import { TARROW } from './tarrow/tarrow';

/** Every team of the demo, the main one first. */
export const SEASON: readonly TeamStory[] = [TARROW, OSSLE];
