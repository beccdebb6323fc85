import { type ClassLaw, type NestModel, classLaws, nestModel, wholeLaw } from './class-law';
import type { DayLaw } from './day-law';
import type { DurationRow } from './durations';
import type { BroodSettings } from './settings';
import type { StageGroup } from './stages';

/** The laws of one model, worked out when first asked for. */
interface LawBook {
  model: NestModel;
  /** The law of each of these classes, by its key. */
  classesOf(groups: readonly StageGroup[]): ReadonlyMap<string, ClassLaw>;
  /** The law of the whole development. */
  whole(): DayLaw;
}

function openBook(model: NestModel): LawBook {
  const known = new Map<string, ClassLaw>();
  let ofWhole: DayLaw | undefined;
  return {
    model,
    classesOf(groups) {
      const missing = groups.filter(({ key }) => !known.has(key));
      for (const [key, law] of classLaws(model, missing)) known.set(key, law);
      return known;
    },
    whole: () => (ofWhole ??= wholeLaw(model)),
  };
}

/** Laws depend on nothing but settings and row, so they are kept as long as those live. */
const books = new WeakMap<BroodSettings, WeakMap<DurationRow, LawBook>>();

/** The laws of a taxon under given settings; the same objects give the same book, so many nests share the work. */
export function lawBookFor(row: DurationRow, settings: BroodSettings): LawBook {
  const byRow = books.get(settings) ?? new WeakMap<DurationRow, LawBook>();
  const book = byRow.get(row) ?? openBook(nestModel(row, settings));
  books.set(settings, byRow.set(row, book));
  return book;
}
