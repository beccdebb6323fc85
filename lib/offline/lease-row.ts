/** Which tab drains now, and until when others leave it alone. */
export interface Lease {
  holder: string;
  /** Epoch milliseconds of the phone's clock. */
  until: number;
}
