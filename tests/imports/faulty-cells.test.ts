import { describe, expect, it } from 'vitest';
import { isFaulty } from '../../server/features/imports/cells/faulty-cells.ts';
import { linesOf, read } from './support.ts';

const list = (...rows: string[]) => ['Date,Car,Category,Details,Vendor,Paid', ...rows].join('\n');

describe('cells in which a formula failed', () => {
  it('are known in the words of several spreadsheet programs, and texts beside them are not', () => {
    const faults =
      '#REF! #N/A #NV #DIV/0! #NAME? #¡VALOR! #BEZUG! Err:502 =B3 =SUM(A1:A3) =[1]Kosten!B2 ########'.split(' ');
    expect(faults.filter((cell) => !isFaulty(cell))).toEqual([]);
    expect(['#1', '#12 door', 'Error', 'E350', '= two doors', 'n/a'].filter(isFaulty)).toEqual([]);
  });

  it('name no vehicle: their rows are put aside', () => {
    const reading = read(
      list(
        '1/13/2021,13 Focus,Parts,door,Ace,90',
        '1/14/2021,#REF!,Parts,door,Ace,100',
        '1/15/2021,=B3,Parts,door,Ace,50',
      ),
    );
    expect(reading.rebuilds.map(({ tag }) => tag)).toEqual(['13 Focus']);
    expect(reading.asides).toMatchObject([
      { row: 3, col: 2, reason: 'missing-vehicle', cents: 10_000 },
      { row: 4, col: 2, reason: 'missing-vehicle', cents: 5_000 },
    ]);
  });

  it('say nothing in a text: the row comes in without it, and the cell is put aside', () => {
    const reading = read(list('1/13/2021,13 Focus,#N/A,#NAME?,Err:502,90'));
    expect(linesOf(reading)).toMatchObject([
      { category: 'other', what: null, vendor: null, cents: 9000, isGuess: true },
    ]);
    expect(reading.asides.map(({ col, reason, isCell }) => [col, reason, isCell])).toEqual([
      [3, 'bad-value', true],
      [4, 'bad-value', true],
      [5, 'bad-value', true],
    ]);
  });

  it('are no facts of a vehicle in a row of its own', () => {
    const reading = read(
      'Stock,Year,Model,Bid,Parts,Damage\nA1,2013,#NAME?,100.00,#REF!,#N/A\nA2,2014,Soul,100.00,20.00,front',
    );
    expect(reading.rebuilds[0]).toMatchObject({ tag: 'A1', model: null, damageName: null, purchaseCents: 10_000 });
    expect(reading.asides.map(({ col, reason }) => [col, reason])).toEqual([
      [3, 'bad-value'],
      [5, 'bad-amount'],
      [6, 'bad-value'],
    ]);
  });

  it('are put aside, and are no note, where a section of a vehicle sheet has no headings', () => {
    const reading = read('2013 Ford Focus\nParts\ndoor,#REF!\nhood,100.00\nfender,80.00\nTotal,180.00');
    expect(reading.asides).toMatchObject([{ row: 3, col: 2, reason: 'bad-amount' }]);
    expect(reading.control.costCents).toBe(18_000);
  });
});
