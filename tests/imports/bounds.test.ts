import { describe, expect, it } from 'vitest';
import { read } from './support.ts';

const LIST = 'Date,Car,What for,Paid\n';
const MILLIONS = '9999999999.99';

describe('what the books can hold', () => {
  it('a file whose amounts add up past it is refused at the row', () => {
    const rows = Array.from({ length: 1100 }, (_, i) => `1/22/2020,13 F-150,Parts ${i},${MILLIONS}`);
    const { refusal, control } = read(LIST + rows.join('\n'));
    expect(refusal).toMatchObject({ kind: 'too-large', row: 1002, message: expect.stringContaining('Row 1002') });
    expect(control.costCents).toBe(0);
  });

  it('so is a purchase made of several rows, and a plan', () => {
    const purchases = [1, 2].map((day) => `1/${day + 20}/2020,13 F-150,Purchase,${MILLIONS}`);
    expect(read(LIST + purchases.join('\n')).refusal).toMatchObject({ kind: 'too-large', row: 3 });
    const plan = [
      'Stock,Year,Make,Model,Purchase,Parts est,Parts act,Body est,Body act',
      `A1,2013,Ford,F-150,100.00,${MILLIONS},10.00,1.00,1.00`,
    ].join('\n');
    expect(read(plan).refusal).toBe(null);
  });

  it('half a letter of UTF-16 is refused, not replaced', () => {
    const good = `${LIST}1/22/2020,13 F-150,Parts 😀,10.00`;
    expect(read(Buffer.from(`\ufeff${good}`, 'utf16le')).refusal).toBe(null);
    const damaged = Buffer.from(`\ufeff${good.replace('😀', '\ud83d')}`, 'utf16le');
    expect(read(damaged).refusal).toMatchObject({ kind: 'not-text', message: expect.stringContaining('damaged') });
  });
});
