import type { PhoneClock } from '@/lib/offline/phone-clock';
import type { Timers } from '@/lib/offline/timers';

interface Alarm {
  at: number;
  fire(): void;
}

/** Lets everything go on that needs no time. */
function settle(): Promise<void> {
  return new Promise((resolve) => setImmediate(resolve));
}

/** Time that passes only when a test says so; also the clock of that time. */
export class ManualTimers implements Timers, PhoneClock {
  private time: number;
  private alarms: Alarm[] = [];

  constructor(start = Date.UTC(2026, 5, 16, 9, 41)) {
    this.time = start;
  }

  after(ms: number, fire: () => void): () => void {
    const alarm = { at: this.time + ms, fire };
    this.alarms.push(alarm);
    return () => {
      this.alarms = this.alarms.filter((other) => other !== alarm);
    };
  }

  now(): number {
    return this.time;
  }

  mono(): number {
    return this.time % 86_400_000;
  }

  boot(): string {
    return '5f0c3a52-8a2f-4d0c-9f0a-0a6f5a1c2b3d';
  }

  offsetMinutes(): number {
    return -240;
  }

  /** Sets the clock without any time passing. */
  set(epochMs: number): void {
    const jump = epochMs - this.time;
    this.time = epochMs;
    for (const alarm of this.alarms) alarm.at += jump;
  }

  /** Lets time pass, firing every alarm at its moment. */
  async pass(ms: number): Promise<void> {
    const end = this.time + ms;
    await settle();
    for (let next = this.due(end); next; next = this.due(end)) {
      this.alarms = this.alarms.filter((alarm) => alarm !== next);
      this.time = Math.max(this.time, next.at);
      next.fire();
      await settle();
    }
    this.time = end;
    await settle();
  }

  private due(end: number): Alarm | undefined {
    return this.alarms.filter(({ at }) => at <= end).sort((a, b) => a.at - b.at)[0];
  }
}
