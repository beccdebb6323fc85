import { describe, expect, test } from 'vitest';
import { HAND_DEFAULTS, HAND_SCRIPT, parseHandSettings } from '@/components/field/hand/hand-settings';
import { BUZZ, feedbackOf, localVoice } from '@/components/field/hand/press-feedback';

const unsaved = [{ opId: 'o', words: 'Cell 3: egg', reason: 'full' as const }];

describe('what a press means for the hand', () => {
  test('a press that is kept, one that is not, and everything else', () => {
    expect(feedbackOf({ saved: 3, unsaved: [] }, { saved: 4, unsaved: [] })).toBe('kept');
    expect(feedbackOf({ saved: 3, unsaved: [] }, { saved: 3, unsaved })).toBe('not-kept');
    expect(feedbackOf({ saved: 3, unsaved }, { saved: 4, unsaved: [] })).toBe('kept');
    expect(feedbackOf({ saved: 3, unsaved: [] }, { saved: 3, unsaved: [] })).toBeNull();
  });

  test('20 ms for the one, 60, 40 and 60 ms for the other', () => {
    expect(BUZZ).toEqual({ kept: [20], 'not-kept': [60, 40, 60] });
  });
});

describe('the voice', () => {
  const voice = (lang: string, localService: boolean, isDefault = false) => ({
    lang,
    localService,
    default: isDefault,
  });

  test('is one of the device, in English, the usual one before others', () => {
    const usual = voice('en-GB', true, true);
    expect(localVoice([voice('en-US', false, true), voice('de-DE', true), voice('en-US', true), usual])).toBe(usual);
  });

  test('is none where every English one needs the network', () => {
    expect(localVoice([voice('en-US', false, true), voice('fr-FR', true)])).toBeNull();
    expect(localVoice([])).toBeNull();
  });
});

describe('the settings of the hand', () => {
  test('begin bright, right-handed, with a buzz and without a voice', () => {
    expect(HAND_DEFAULTS).toMatchObject({ lamp: false, left: false, buzz: true, speak: false });
  });

  test('come back as they were stored; anything else in the store is passed over', () => {
    expect(parseHandSettings('{"lamp":true,"speak":true}')).toEqual({ ...HAND_DEFAULTS, lamp: true, speak: true });
    expect(parseHandSettings('{"lamp":"yes","other":true}')).toEqual(HAND_DEFAULTS);
    for (const text of [null, '', 'x', '[]', 'null', '7']) expect(parseHandSettings(text)).toEqual(HAND_DEFAULTS);
  });

  test('the script that runs before the first drawing holds no sign that React would write as an entity', () => {
    expect(HAND_SCRIPT).not.toMatch(/["'<>&]/);
  });
});
