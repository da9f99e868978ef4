import fc from 'fast-check';
import { expect, it } from 'vitest';
import { byCodePoint } from '../../server/domain/text-order.ts';

it('names are ordered by code point, as sorting their code points would', () => {
  expect(['b', 'a', 'B', 'ab', ''].toSorted(byCodePoint)).toEqual(['', 'B', 'a', 'ab', 'b']);
  fc.assert(
    fc.property(fc.string({ unit: 'binary' }), fc.string({ unit: 'binary' }), (a, b) => {
      const [x, y] = [[...a], [...b]].map((text) =>
        text.map((one) => (one.codePointAt(0) ?? 0).toString(16).padStart(6, '0')).join(''),
      );
      expect(Math.sign(byCodePoint(a, b))).toBe((x ?? '') < (y ?? '') ? -1 : x === y ? 0 : 1);
    }),
  );
});
