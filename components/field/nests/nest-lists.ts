import { writtenOn } from '@/components/field/words/written-time';
import { CODE_LENGTH, plainCode, sheetCode } from '@/lib/kit/sheet-code';
import type { NestSummary } from '@/lib/offline/nest-view';

/** The nests of the day, and all the others. */
export interface NestLists {
  today: NestSummary[];
  others: NestSummary[];
}

/** Nests worked on today: visited or opened today, or with something still to be sent. Archived ones are left out. */
export function splitByDay(nests: readonly NestSummary[], today: string): NestLists {
  const lists: NestLists = { today: [], others: [] };
  for (const nest of nests) {
    if (nest.archived) continue;
    const now = writtenOn(nest.lastVisitAt, today) || writtenOn(nest.openedAt, today) || nest.waiting > 0;
    lists[now ? 'today' : 'others'].push(nest);
  }
  return lists;
}

/** Nests whose code or name holds the words, in any letter case, or whose paper sheet bears them. No words: all. */
export function findNests(nests: readonly NestSummary[], words: string): NestSummary[] {
  const wanted = words.trim().toLowerCase();
  const code = plainCode(words);
  const mayBeCode = code.length === CODE_LENGTH;
  return nests.filter(
    (nest) =>
      `${nest.code} ${nest.name ?? ''}`.toLowerCase().includes(wanted) ||
      (mayBeCode && plainCode(sheetCode(nest.id)) === code),
  );
}

/** What a nest is called: its name and code, or the code alone. */
export function nestTitle({ code, name }: Pick<NestSummary, 'code' | 'name'>): string {
  return name ? `${name} ·\u00a0${code}` : code;
}
