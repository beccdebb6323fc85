/** The protocol version spoken on the wire. */
export const PROTOCOL = 1;

/** The client's data schema, sent with every push so the server can tell old phones apart. */
export const SCHEMA = 1;

/** Most operations in one push. */
export const MAX_OPS_PER_PUSH = 100;

/** Largest request body in bytes. */
export const MAX_BODY_BYTES = 256 * 1024;

/** Largest operation in bytes of canonical JSON, its free text left out (that has a limit of its own). */
export const MAX_OP_BYTES = 16 * 1024;

/** Most explicit dependencies of one operation. */
export const MAX_DEPS = 20;

/** Longest free text, in code points. Longer text is set aside whole, never cut. */
export const MAX_TEXT = 10_000;

/** Longest name, label or code, in code points. */
export const MAX_NAME = 200;

/** Most rows in one pull page. */
export const MAX_PULL_ROWS = 500;

/** Most ids in one `have` question. */
export const MAX_HAVE_IDS = 1_000;

/** A wall clock further off than this is flagged. */
export const CLOCK_FLAG_MS = 2 * 60_000;

/** Header that every request of the sync protocol carries; it also forces a browser to ask before crossing origins. */
export const SYNC_HEADER = 'X-Sync';

/** Header in which a phone may say how many operations it still holds that the office has not got. */
export const UNSENT_HEADER = 'X-Unsent';

/** Header that names the enrolled device. */
export const DEVICE_HEADER = 'X-Device';
