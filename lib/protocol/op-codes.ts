/** Why an operation was not simply applied. The words for people live with the screens. */
export const OP_CODES = [
  // its form
  'shape',
  'unknown-field',
  'id',
  'unicode',
  'control',
  'number',
  'deps',
  'kind',
  'newer',
  'time',
  'tz',
  'cell',
  'value',
  'too-long',
  'place',
  'hash',
  // what it meets
  'exists',
  'entity',
  'target',
  'retracted',
  'base',
  'conflict',
  'right',
  'failed',
] as const;

/** One of `OP_CODES`. */
export type OpCode = (typeof OP_CODES)[number];

/** What was surprising about an operation that was applied all the same. */
export const OP_FLAGS = ['clock', 'mono', 'late', 'conflict', 'place', 'archived'] as const;

/** One of `OP_FLAGS`. */
export type OpFlag = (typeof OP_FLAGS)[number];
