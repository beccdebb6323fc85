/** The time source a pure core is handed: wall time in epoch milliseconds and a monotonic reading. */
export interface Clock {
  /** Epoch milliseconds of the wall clock, which may jump. */
  now(): number;
  /** Milliseconds since some fixed start of this boot; never goes back. */
  mono(): number;
  /** Names the boot that `mono` counts from (a UUID): equal boots make `mono` comparable. */
  boot(): string;
}
