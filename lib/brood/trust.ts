/** How far a number can be trusted, strongest first. `assumption` marks a number that nobody has published. */
export type Trust = 'medium' | 'low' | 'very low' | 'assumption';

/** The trust words, for checking what comes from outside. */
export const TRUST_WORDS = ['medium', 'low', 'very low', 'assumption'] as const satisfies readonly Trust[];

/** Is this one of the trust words? */
export function isTrust(value: unknown): value is Trust {
  return typeof value === 'string' && (TRUST_WORDS as readonly string[]).includes(value);
}
