import type { FigureFacts } from '@/components/charts/figure';
import { fullDateWords } from '@/components/ui/date-words';
import type { BroodEstimate } from '@/lib/brood/answer';

/** The figures of a brood page: the part of the file's name, and what is said below the drawing. */
const FIGURES = {
  'brood-comb': 'Comb from below, 12 at the top; days since the egg was laid.',
  'nest-dates': 'Ranges of 50 (thick), 80 and 95 (thin) in 100.',
  'brood-strips': 'Egg and larva light, capped dark; ranges of 50 (thick), 80 and 95 (thin) in 100.',
  'adults-per-day': 'Adults expected per day with the range that holds 80 in 100.',
} as const;

/** What a file with one of the figures is called and says. */
export function figureFacts(
  figure: keyof typeof FIGURES,
  { code, day, estimate }: { code: string; day: string; estimate: Pick<BroodEstimate, 'model' | 'settings'> },
): FigureFacts {
  const { model, settings } = estimate;
  return {
    code,
    figure,
    asOf: day,
    caption: [
      `${code}, estimate as known on ${fullDateWords(day)}.`,
      FIGURES[figure],
      `Model ${model.name} ${model.version}, settings version ${settings.version}.`,
    ],
  };
}
