/** Why the last attempt did not get through; null when it did or none was made. */
export type Trouble = 'no-answer' | 'no-real-connection' | 'office-busy' | null;
