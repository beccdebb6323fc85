/** What a page is for, in two or three sentences. */
export interface HelpTopic {
  /** Matches the path of the page. */
  path: RegExp;
  words: readonly string[];
}

/** Help at the point of need: the first topic that fits a path. */
const TOPICS: readonly HelpTopic[] = [
  {
    path: /^\/nests\/[^/]+\/readings\//,
    words: [
      'One reading: what one person saw in each cell at one visit. The marks of a technician are never changed.',
      'A reviewer settles single cells with a reason, then locks. A locked reading can only be amended, as a new version.',
    ],
  },
  {
    path: /^\/nests\/[^/]+$/,
    words: [
      'One nest: her comb from below, when her brood was laid and comes out, her visits and readings.',
      'Every date is an estimate with a range. Press a cell to see its own dates; open Assumptions to see what they rest on.',
    ],
  },
  {
    path: /^\/nests$/,
    words: [
      'Every nest of your team. She appears when a phone has sent her for the first time.',
      'The state on the right: not read yet, being read, handed in, settled, locked.',
    ],
  },
  {
    path: /^\/hosts$/,
    words: [
      'Places where a nest may be put, and the people who offer them. A place is chosen before a nest is taken down.',
    ],
  },
  {
    path: /^\/downloads$/,
    words: [
      'The data as files, one row for each reading or cell. The dictionary says what each column holds and what a blank means.',
    ],
  },
  {
    path: /^\/members$/,
    words: [
      'Who is in the team and in which role. An invitation is a letter with a link that works once, for seven days.',
      'A role counts from the person’s next page on. Ending a membership ends every sign-in; records stay.',
    ],
  },
  {
    path: /^\/phones$/,
    words: [
      'Every phone that may send for a person. “Unsent” is what it said it still held when it was last seen.',
      'Withdraw one that is lost: its next request is refused. If it turns up, it is enrolled anew.',
    ],
  },
  {
    path: /^\/account$/,
    words: [
      'Your password and the browsers you are signed in with. End a sign-in you do not know, then change the password.',
    ],
  },
];

/** What to say about the page at a path; null for a page that explains itself. */
export function helpFor(path: string): readonly string[] | null {
  return TOPICS.find((topic) => topic.path.test(path))?.words ?? null;
}
