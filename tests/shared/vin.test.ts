import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkVin } from '#shared/vin.ts';

const VALID = '1HGCM82633A004352';

// Sums and digits of published numbers are checked in tests/reference.
describe('checkVin', () => {
  it('reads lower case and outer blanks', () => {
    expect(checkVin(` ${VALID.toLowerCase()} `)).toMatchObject({
      vin: VALID,
      isValid: true,
      problem: null,
      suggestions: [],
    });
  });

  it('says what is wrong', () => {
    expect(checkVin('1HGCM').problem).toBe('length');
    expect(checkVin('').problem).toBe('length');
    expect(checkVin('1HGCM82633A0043-2').problem).toBe('character');
    expect(checkVin('1HGCM82633A004353')).toMatchObject({ problem: 'check digit', expectedDigit: '5' });
  });

  it.each([
    ['O', '0'],
    ['Q', '0'],
  ])('takes %s for a %s', (letter, digit) => {
    const typed = VALID.replaceAll(digit, letter);
    expect(checkVin(typed)).toMatchObject({ isValid: false, problem: 'character', suggestions: [VALID] });
  });

  it('takes I for a 1', () => {
    expect(checkVin(VALID.replace('1', 'I')).suggestions).toEqual([VALID]);
  });

  it('offers 8 for B, 5 for S and the other way round', () => {
    expect(checkVin('1HGCMB2633A004352').suggestions).toContain(VALID);
    expect(checkVin('1HGCM82633A0043S2').suggestions).toContain(VALID);
  });

  it('offers only numbers that fit', () => {
    const text = fc.string({
      unit: fc.constantFrom(...'0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ'),
      minLength: 17,
      maxLength: 17,
    });
    fc.assert(
      fc.property(text, (vin) => {
        for (const suggestion of checkVin(vin).suggestions) expect(checkVin(suggestion).isValid).toBe(true);
      }),
    );
  });

  it('sees every single wrong digit but one of equal value', () => {
    fc.assert(
      fc.property(fc.nat({ max: 16 }), fc.constantFrom(...'0123456789'), (place, digit) => {
        const typed = VALID.slice(0, place) + digit + VALID.slice(place + 1);
        const values = { before: checkVin(VALID).sum, after: checkVin(typed).sum };
        expect(checkVin(typed).isValid).toBe(typed === VALID || (place !== 8 && values.before === values.after));
      }),
    );
  });
});
