import type { PhoneClock } from '@/lib/offline/phone-clock';
import type { World } from './world';

/** The instant at which every simulated season begins: 16 June 2026, 09:00 UTC. */
const SEASON_START = Date.UTC(2026, 5, 16, 9);

/** A phone's clock that can be set wrong. */
export class SimClock implements PhoneClock {
  /** How far the wall clock is ahead of the truth. */
  aheadMs = 0;

  constructor(
    private readonly world: World,
    private readonly bootId: string,
  ) {}

  now(): number {
    return Math.floor(SEASON_START + this.world.time + this.aheadMs);
  }

  mono(): number {
    return this.world.time;
  }

  boot(): string {
    return this.bootId;
  }

  offsetMinutes(): number {
    return -240;
  }
}
