import { describe, expect, it } from 'vitest';
import { COMMON_WORDS } from '@/lib/server/auth/common-words';
import { passwordFault } from '@/lib/server/auth/password-rules';
import { seededRandom } from '@/lib/kit/random';

const OWNER = {
  email: 'oriel.webb@tarrow.example',
  name: 'Oriel Webb-Nakada',
  teams: ['Tarrow County Underhang Trust'],
};
const faultOf = (password: string) => passwordFault(password, OWNER);

describe('a new password', () => {
  it('has 15 to 256 signs, counted as a person counts them (NIST SP 800-63B-4, 3.1.1.2: at least 15)', () => {
    expect(faultOf('kestrelgravels')).toBe('password-length');
    expect(faultOf('kestrel gravels')).toBeNull();
    expect(faultOf(`${'kestrel gravels'.repeat(17)}x`)).toBeNull();
    expect(faultOf(`${'kestrel gravels'.repeat(17)}xy`)).toBe('password-length');
    expect(faultOf('🦊🐝🌾🪨🌧🍂🪵🐌🌒🧭🪢🧺🪟🕯🧵')).toBeNull();
  });

  it('needs no figures, capitals or signs, and keeps outer spaces', () => {
    expect(faultOf('eleven kestrels over gravel')).toBeNull();
    expect(faultOf('  kestrels gravel  ')).toBeNull();
  });

  it.each([
    ['a common word twice', 'passwordpassword'],
    ['common words with a year', 'Welcome-Sunshine-2026'],
    ['figures for letters', 'P4$$w0rd!P4$$w0rd!'],
    ['a 1 for an l', 'fami1yfami1y2026'],
    ['nothing but figures', '314159265358979'],
    ['nothing but signs', '!!!!????####....'],
    ['one sign again and again', 'zzzzzzzzzzzzzzzzzz'],
    ['two signs in turn', 'xoxoxoxoxoxoxoxoxo'],
    ['a run of keys', 'qwertyuiopasdfghjkl'],
    ['a run of keys backwards', 'poiuytrewqlkjhgfdsa'],
    ['the alphabet', 'abcdefghijklmnopq'],
    ['a short word again and again', 'kestrelkestrelkestrel'],
    ['the trade’s own words', 'paper wasp nest comb'],
    ['the published password of the demo', 'seven-quiet-ladders-2026'],
    ['full-width letters', 'ｐａｓｓｗｏｒｄｐａｓｓｗｏｒｄ'],
  ])('is not made of %s', (_what, password) => {
    expect(faultOf(password)).toBe('common');
  });

  it.each([
    ['the product', 'kestrels Undereave gravel'],
    ['the team', 'tarrow county underhang trust kestrels'],
    ['the e-mail address', 'kestrels oriel.webb@tarrow.example'],
    ['the local part of it', 'gravel-orielwebb-kestrels'],
  ])('does not name %s', (_what, password) => {
    expect(faultOf(password)).toBe('common');
  });

  it('is not made of the person’s own name, though a part of it may stand in it', () => {
    expect(faultOf('Oriel Nakada Webb 1987')).toBe('common');
    expect(faultOf('Oriel keeps gravel kestrels')).toBeNull();
  });

  it('may hold a common word among others', () => {
    expect(faultOf('monkey bridge over cold gravel')).toBeNull();
  });

  it('made by a password manager is taken (1,000 of them, seed 7)', () => {
    const random = seededRandom(7);
    const signs = 'ABCDEFGHJKLMNPQRSTUVWXYZabcdefghijkmnopqrstuvwxyz23456789!#%+:=?@';
    for (let i = 0; i < 1_000; i++) {
      const password = Array.from({ length: 20 }, () => signs[Math.floor(random() * signs.length)]).join('');
      expect([password, faultOf(password)]).toEqual([password, null]);
    }
  });

  it('made of two words of the list and a figure is refused, whichever they are (seed 11, 3,000 pairs)', () => {
    const random = seededRandom(11);
    const pick = () => COMMON_WORDS[Math.floor(random() * COMMON_WORDS.length)] ?? '';
    for (let i = 0; i < 3_000; i++) {
      const password = `${pick()}${pick()}${Math.floor(random() * 10_000)}`.padEnd(15, '1');
      expect([password, faultOf(password)]).toEqual([password, 'common']);
    }
  });
});
