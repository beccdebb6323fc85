import type { Trust } from '@/lib/brood/trust';

/** A subject, and what the product does not know or do about it. */
export interface Limit {
  title: string;
  words: string;
}

/** What comes before any use of the product. */
export const CAUTIONS: readonly Limit[] = [
  {
    title: 'Stings',
    words:
      'A sting can kill, also a first one, also somebody who was stung before without harm. Your own plan and local medical direction rule. The product gives no doses and no treatment.',
  },
  {
    title: 'Ladders, power lines, traffic',
    words: 'It cannot see where you stand. When in doubt, come down first and leave her.',
  },
  {
    title: 'Sprayed nests',
    words: 'Residue is not seen in a comb. A nest that may have been sprayed is not touched.',
  },
  {
    title: 'Law, permits, the landowner',
    words:
      'It knows no law of any place. Permits and the landowner’s consent come before a move, and no nest crosses a border.',
  },
  {
    title: 'Species',
    words:
      'It takes the species you enter. Introduced or unknown species are not moved; where you are not sure, she stays.',
  },
  {
    title: 'Others decide first',
    words: 'Where licensed pest management, a beekeeper or an authority is in charge, they decide.',
  },
];

/** What stands behind no date and no page here. */
export const UNKNOWNS: readonly Limit[] = [
  {
    title: 'How she will fare after a move',
    words:
      'No number here says how likely she is to stay. Published numbers of moved nests are small, and nests that were left alone are too few to compare with.',
  },
  {
    title: 'What her brood was fed, and how warm it was inside the cell',
    words:
      'Both change how fast brood grows. The published durations name no temperature of the comb; the one they are taken for is an assumption.',
  },
  {
    title: 'Whether a cell was read right',
    words:
      'An egg against the light is missed, a cap looks whole from above. That is why a second person reads without seeing the first reading.',
  },
  {
    title: 'What happened between two visits',
    words:
      'A cell can lose its brood and be laid in again. A cell that cannot have come from what was seen before is asked about, never put right by itself.',
  },
  {
    title: 'Who she is',
    words:
      'A second female can take a nest over. Only a photo of the face shows it, and only to somebody who compares.',
  },
  {
    title: 'What a phone still holds',
    words:
      'The office knows what a phone said when it was last seen. A phone that is lost or cleared before it has sent takes the rest with it.',
  },
];

/** What each word of trust says about a number. */
export const TRUST_MEANINGS: readonly { trust: Trust; words: string }[] = [
  { trust: 'medium', words: 'published for this species, by one study or a few' },
  { trust: 'low', words: 'published for a related species that stands in' },
  { trust: 'very low', words: 'stands in from far away: another group, another climate' },
  { trust: 'assumption', words: 'nobody has published it; chosen by the programme' },
];

/** A number of the model as it is told: at most three decimals, no trailing noughts. */
export function settingWords(value: number, unit: string): string {
  const figure = String(Number(value.toFixed(3)));
  const one = value === 1 && unit === 'days' ? 'day' : unit;
  return one === '' ? figure : `${figure} ${one}`;
}
