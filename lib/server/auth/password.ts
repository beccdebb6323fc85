import 'server-only';

/** The published minimum for Argon2id (OWASP password storage): 19 MiB, two passes, one lane. */
const ARGON2ID = { algorithm: 2, memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** Shortest and longest password, in code points. Longer ones are refused before any hashing. */
export const PASSWORD_LENGTH = { min: 15, max: 256 } as const;

/** Loaded when needed: the module carries a native library that pages without sign-in do not want. */
const argon2 = () => import('@node-rs/argon2');

/** A hash that no password opens, for spending the same time on an account that does not exist. */
const NOBODY = '$argon2id$v=19$m=19456,t=2,p=1$OKaR7/j/W2cLXF9AQUAlpQ$H9KqixIYWpR9uLpovIJb8jS5TUiC1nzQyNMYu1w76IQ';

/** Is the password too long to be hashed? Nothing is ever cut off. */
export function isTooLong(password: string): boolean {
  return password.length > 2 * PASSWORD_LENGTH.max || [...password].length > PASSWORD_LENGTH.max;
}

/** May this be somebody's new password, as far as its length goes? */
export function isPasswordLength(password: string): boolean {
  return !isTooLong(password) && [...password].length >= PASSWORD_LENGTH.min;
}

/** The Argon2id hash of a password, in PHC text. */
export async function hashPassword(password: string): Promise<string> {
  const { hash } = await argon2();
  return hash(password, ARGON2ID);
}

/** Does the password belong to the hash? With null it takes the same time and says no. */
export async function verifyPassword(passwordHash: string | null, password: string): Promise<boolean> {
  const { verify } = await argon2();
  const matches = await verify(passwordHash ?? NOBODY, password);
  return passwordHash !== null && matches;
}
