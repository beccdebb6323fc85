/** What progress needs from outside, so that it can be watched in a test. */
export interface ProgressEdges {
  /** Milliseconds from any fixed start. */
  now(): number;
  write(line: string): void;
  /** Calls `tick` every `ms` milliseconds until the returned function is called. */
  every(ms: number, tick: () => void): () => void;
}

/** Says what is being done and how long it has taken. */
export interface Progress {
  /** Runs one piece of work, announcing its start, its end and, when it takes long, that it still runs. */
  step<T>(label: string, work: () => Promise<T>): Promise<T>;
  /** A line of its own. */
  note(line: string): void;
}

const HEARTBEAT_MS = 15_000;

/** `7.4 s` below a minute, `3 min 05 s` above. */
export function seconds(ms: number): string {
  if (ms < 60_000) return `${(ms / 1000).toFixed(1)} s`;
  const whole = Math.round(ms / 1000);
  return `${Math.floor(whole / 60)} min ${String(whole % 60).padStart(2, '0')} s`;
}

const TERMINAL: ProgressEdges = {
  now: () => performance.now(),
  write: (line) => console.log(line),
  every: (ms, tick) => {
    const timer = setInterval(tick, ms);
    return () => clearInterval(timer);
  },
};

/** Progress on the terminal: every line starts with the time since the command began. */
export function createProgress(edges: ProgressEdges = TERMINAL): Progress {
  const begun = edges.now();
  const note = (line: string) => edges.write(`[${seconds(edges.now() - begun).padStart(11)}] ${line}`);
  const step = async <T>(label: string, work: () => Promise<T>): Promise<T> => {
    const started = edges.now();
    const taken = () => seconds(edges.now() - started);
    note(`${label} ...`);
    const stop = edges.every(HEARTBEAT_MS, () => note(`${label}: still at it after ${taken()}`));
    try {
      const value = await work();
      note(`${label}: done in ${taken()}`);
      return value;
    } catch (error) {
      note(`${label}: failed after ${taken()}`);
      throw error;
    } finally {
      stop();
    }
  };
  return { step, note };
}
