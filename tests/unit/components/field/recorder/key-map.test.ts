import { describe, expect, test } from 'vitest';
import { commandOfKey, NO_CELL_KEY } from '@/components/field/recorder/key-map';
import { CELL_STATES, STATE_LETTERS } from '@/lib/comb/states';

const press = (key: string, held: Partial<Record<'shiftKey' | 'ctrlKey' | 'metaKey' | 'altKey', boolean>> = {}) =>
  commandOfKey({ key, shiftKey: false, ctrlKey: false, metaKey: false, altKey: false, ...held });

describe('the letters of the paper sheet', () => {
  test.each(CELL_STATES)('mark %s', (state) => {
    expect(press(STATE_LETTERS[state])).toEqual({ do: 'mark', state });
  });

  test('work in capitals and with the printed dash', () => {
    expect(press('C', { shiftKey: true })).toEqual({ do: 'mark', state: 'capped' });
    expect(press('–')).toEqual({ do: 'mark', state: 'empty' });
  });
});

describe('the other keys', () => {
  test('set nectar and unsure', () => {
    expect(press("'")).toEqual({ do: 'toggle', mark: 'nectar' });
    expect(press('?', { shiftKey: true })).toEqual({ do: 'toggle', mark: 'unsure' });
  });

  test('undo by Backspace, Ctrl+Z and Command+Z', () => {
    for (const command of [press('Backspace'), press('z', { ctrlKey: true }), press('z', { metaKey: true })]) {
      expect(command).toEqual({ do: 'undo' });
    }
  });

  test('step in six directions, Shift taking the other neighbour above or below', () => {
    expect(press('ArrowLeft')).toEqual({ do: 'step', step: { key: 'ArrowLeft', shift: false } });
    expect(press('ArrowUp', { shiftKey: true })).toEqual({ do: 'step', step: { key: 'ArrowUp', shift: true } });
  });

  test('pass a place without a cell by a letter that no state uses', () => {
    expect(press(NO_CELL_KEY)).toEqual({ do: 'no-cell' });
    expect(Object.values(STATE_LETTERS)).not.toContain(NO_CELL_KEY);
  });

  test('leave the browser its own', () => {
    for (const command of [press('F5'), press('Tab'), press('Enter'), press(' '), press('q')])
      expect(command).toBeNull();
    expect(press('c', { ctrlKey: true })).toBeNull();
    expect(press('o', { altKey: true })).toBeNull();
  });
});
