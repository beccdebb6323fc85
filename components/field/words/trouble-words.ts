/** Why an operation is not at the office in the normal way. */
export type Why = 'waiting' | 'refused' | 'suspect' | 'set-aside';

/** What happened to an item, and what the person can do about it. */
export interface TroubleWords {
  what: string;
  todo: string;
}

const REFUSED: Readonly<Record<string, TroubleWords>> = {
  right: {
    what: 'The office did not take it: only the person who opened a reading may mark in it.',
    todo: 'Start a reading of your own at this visit. This item stays on the phone and in the copy.',
  },
};

const SET_ASIDE: Readonly<Record<string, TroubleWords>> = {
  deps: {
    what: 'It is at the office and waits there for an item it belongs to.',
    todo: 'Send what is still on this phone, and on the other phone if there was one. Nothing else to do.',
  },
  newer: {
    what: 'It is at the office, which runs an older version and cannot read it yet.',
    todo: 'Nothing to do. The office takes it in after its update.',
  },
  exists: {
    what: 'It is at the office, set aside: the same thing was opened twice.',
    todo: 'Tell your coordinator. Both are kept.',
  },
  conflict: {
    what: 'It is at the office beside another version of the same item. Both are kept.',
    todo: 'Tell your coordinator. Nothing to do on this phone.',
  },
  'too-long': {
    what: 'It is at the office, set aside whole: the text is longer than 10,000 letters.',
    todo: 'Write it again in two parts. The long text is kept.',
  },
};

const GENERAL: Readonly<Record<Why, TroubleWords>> = {
  waiting: { what: 'Saved on this phone. Not sent yet.', todo: 'It goes by itself when there is signal.' },
  refused: {
    what: 'The office did not take it.',
    todo: 'Tell your coordinator and hand over the copy below. It stays on this phone.',
  },
  suspect: {
    what: 'The office could not read it, twice. It holds nothing else up.',
    todo: 'It is tried again once a day. Hand over the copy below, so that nothing hangs on this phone.',
  },
  'set-aside': {
    what: 'It is at the office, set aside for a person to look at.',
    todo: 'Nothing to do on this phone. Tell your coordinator if it matters today.',
  },
};

/** Plain words for an item that needs a person: what happened and what to do. Unknown codes get the general words. */
export function troubleWords(why: Why, code: string | null): TroubleWords {
  const known: Partial<Record<Why, Readonly<Record<string, TroubleWords>>>> = {
    refused: REFUSED,
    'set-aside': SET_ASIDE,
  };
  const words = known[why] ?? {};
  // The code comes from outside and may spell a name that every object has.
  return (code !== null && Object.hasOwn(words, code) && words[code]) || GENERAL[why];
}
