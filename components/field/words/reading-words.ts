import { countWords } from '@/components/ui/date-words';
import type { ReadingSummary, VisitView } from '@/lib/offline/nest-view';

/** Visit purposes in the order they are offered, with the words on their keys. */
export const PURPOSES = [
  { purpose: 'take-down', title: 'Take-down', hint: 'The nest is being moved.' },
  { purpose: 'check', title: 'Check', hint: 'A look at a nest that stays or was moved.' },
  { purpose: 'lab', title: 'Lab', hint: 'The comb lies on the bench.' },
  { purpose: 'other', title: 'Other', hint: 'Any other reason.' },
] as const satisfies readonly { purpose: VisitView['purpose']; title: string; hint: string }[];

/** The word for a visit's purpose: `Take-down`. */
export function purposeWord(purpose: VisitView['purpose']): string {
  return PURPOSES.find((entry) => entry.purpose === purpose)?.title ?? 'Visit';
}

/** Where the states of a reading come from, with the words on their keys. */
export const SOURCES = [
  { source: 'phone', title: 'The comb' },
  { source: 'paper', title: 'Paper' },
  { source: 'photo', title: 'A photo' },
] as const satisfies readonly { source: ReadingSummary['source']; title: string }[];

const SOURCE_WORDS: Readonly<Record<ReadingSummary['source'], string>> = {
  phone: 'at the comb',
  paper: 'from paper',
  photo: 'from a photo',
};

/** How far one reading has come. */
export function readingState({
  submittedAt,
  standing,
  mine,
}: Pick<ReadingSummary, 'submittedAt' | 'standing' | 'mine'>): string {
  if (standing === 'not-accepted') return 'not accepted by the office';
  if (submittedAt === null) return mine ? 'not handed in yet' : 'still being read';
  return standing === 'waiting' ? 'handed in, waiting to send' : 'handed in, at the office';
}

/** Whose reading it is and how it was made: `Your reading, at the comb`. */
export function readingTitle(reading: Pick<ReadingSummary, 'mine' | 'kind' | 'source'>, observer: string): string {
  const whose = reading.mine ? 'Your' : `${observer}’s`;
  const which = reading.kind === 'second' ? 'second reading' : 'reading';
  return `${whose} ${which}, ${SOURCE_WORDS[reading.source]}`;
}

/** How far the walk is: `14 of 33`, or `14 read` when nobody counted. */
export function progressWords(read: number, counted: number | null): string {
  return counted === null ? `${read} read` : `${read} of ${counted}`;
}

/** A number of visits in words; none is said too. */
export function visitsWords(visits: number): string {
  return visits === 0 ? 'no visit yet' : countWords(visits, 'visit');
}
