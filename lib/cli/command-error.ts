/** A failure that is explained in words; the command prints them without a stack and ends with code 1. */
export class CommandError extends Error {
  override readonly name = 'CommandError';
}

/** The command was told to stop (Ctrl-C or a signal). */
export class Stopped extends Error {
  override readonly name = 'Stopped';
}
