import type { CellPair, Seen } from './compare-cells';
import type { SettlePick } from './settle-pick';

/** What is proposed for a cell, and by which rule; a person still decides. */
export interface SettleSuggestion {
  pick: Extract<SettlePick, 'field' | 'lab'>;
  /** The rule in words, shown beside the proposal and kept as the reason when it is taken. */
  rule: string;
}

function isEggOrEmpty({ state }: Seen): boolean {
  return state === 'egg' || state === 'empty';
}

/** The field saw depth, the lab saw stillness. */
function eggOrEmpty(field: Seen): SettleSuggestion {
  return field.unsure
    ? { pick: 'lab', rule: 'Egg or empty: the field reader was unsure, so the lab’s view stands.' }
    : {
        pick: 'field',
        rule: 'Egg or empty: the field reader was sure and could tilt the light, so the field’s view stands.',
      };
}

function bySureness(field: Seen, lab: Seen): SettleSuggestion | null {
  if (field.unsure === lab.unsure) return null;
  return field.unsure
    ? { pick: 'lab', rule: 'The field reader was unsure, the lab reader was not.' }
    : { pick: 'field', rule: 'The lab reader was unsure, the field reader was not.' };
}

/**
 * What the rules propose for a cell that has to be decided.
 *
 * @returns null where no rule speaks: then somebody looks again.
 */
export function settleSuggestion({ standing, field, lab, clash }: CellPair): SettleSuggestion | null {
  if (standing === 'unread' && lab && lab.state !== 'unread') {
    return { pick: 'lab', rule: 'Only the lab reader could tell what is in this cell.' };
  }
  if (standing !== 'differs' || !field || !lab) return null;
  if (isEggOrEmpty(field) && isEggOrEmpty(lab)) return eggOrEmpty(field);
  return clash ? null : bySureness(field, lab);
}
