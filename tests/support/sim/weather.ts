import type { World } from './world';

/** How rough a run is: chances per event, and mean times in milliseconds. */
export interface Weather {
  /** Chance that a request, or its answer, is lost. */
  lost: number;
  /** Chance that a request arrives twice. */
  twice: number;
  /** Chance that someone else answers: HTML, a redirect's page, another service's JSON. */
  stranger: number;
  /** Chance that an answer is cut off. */
  cut: number;
  /** Longest usual time on the way. */
  latencyMs: number;
  /** Chance that a request takes much longer. */
  slow: number;
  /** Chance that the office dies before or after its commit. */
  officeDies: number;
  /** Chance that a storage transaction is aborted. */
  abort: number;
  /** Chance that the storage connection dies and hangs until it is reopened. */
  hang: number;
  /** Share of operations that the office stumbles over, sets aside or refuses. */
  poison: number;
  /** Mean times between the large events. */
  crashEveryMs: number;
  freezeEveryMs: number;
  restoreEveryMs: number;
  backupEveryMs: number;
  clockJumpEveryMs: number;
  signOutEveryMs: number;
  /** Chance that the browser empties a phone's storage once. */
  wipe: number;
  /** Chance that a phone is cloned once. */
  clone: number;
}

/** No trouble at all. */
export const CALM: Weather = {
  lost: 0,
  twice: 0,
  stranger: 0,
  cut: 0,
  latencyMs: 200,
  slow: 0,
  officeDies: 0,
  abort: 0,
  hang: 0,
  poison: 0,
  crashEveryMs: Infinity,
  freezeEveryMs: Infinity,
  restoreEveryMs: Infinity,
  backupEveryMs: Infinity,
  clockJumpEveryMs: Infinity,
  signOutEveryMs: Infinity,
  wipe: 0,
  clone: 0,
};

/** The weather of a run: rough in most ways, in each run differently. */
export function roughWeather(world: World): Weather {
  const some = (most: number) => (world.chance(0.25) ? 0 : world.between(0, most));
  return {
    lost: some(0.3),
    twice: some(0.2),
    stranger: some(0.15),
    cut: some(0.1),
    latencyMs: world.between(50, 1_500),
    slow: some(0.08),
    officeDies: some(0.1),
    abort: some(0.05),
    hang: some(0.01),
    poison: some(0.04),
    crashEveryMs: world.between(8_000, 60_000),
    freezeEveryMs: world.between(20_000, 120_000),
    restoreEveryMs: world.between(40_000, 300_000),
    backupEveryMs: world.between(10_000, 60_000),
    clockJumpEveryMs: world.between(20_000, 200_000),
    signOutEveryMs: world.between(60_000, 400_000),
    wipe: world.chance(0.15) ? 1 : 0,
    clone: world.chance(0.25) ? 1 : 0,
  };
}
