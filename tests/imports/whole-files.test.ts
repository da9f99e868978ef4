import { describe, expect, it } from 'vitest';
import { linesOf, read } from './support.ts';

const list = (...rows: string[]) => ['Date,Car,What for,Details,Paid', ...rows].join('\n');

describe('questions that only a person can answer', () => {
  it('the order of day and month is asked when no day is above 12, and settled when one is', () => {
    const rows = [
      '3/4/2020,13 F-150,Parts,door,10.00',
      '1/2/2020,13 F-150,Parts,hood,10.00',
      '2/9/2020,13 F-150,Parts,mirror,10.00',
    ];
    expect(read(list(...rows)).choices).toMatchObject([{ id: 'date-order:1', preset: 'MDY', mustAsk: true }]);
    expect(read(list(...rows, '2/13/2020,13 F-150,Parts,lamp,10.00')).choices).toEqual([]);
    expect(linesOf(read(list(...rows), { answers: { 'date-order:1': 'DMY' } }))[0]?.on).toBe('2020-04-03');
  });

  it('a spelling that fits two vehicles equally is put aside until someone says which', () => {
    const text = list(
      '2020-01-02,05 Caravan,Parts,door,10.00',
      '2020-01-02,12 Caravan,Parts,door,20.00',
      '2020-01-03,Caravan,Parts,hood,30.00',
    );
    const reading = read(text);
    expect(reading.asides).toMatchObject([{ row: 4, col: 2, reason: 'ambiguous-vehicle', cents: 3000 }]);
    const choice = reading.choices.find((one) => one.kind === 'vehicle');
    expect(choice).toMatchObject({
      mustAsk: true,
      options: expect.arrayContaining([{ value: '2012|caravan', label: '12 Caravan' }]),
    });
    const answered = read(text, { answers: { [choice?.id ?? '']: '2012|caravan' } });
    expect(answered.asides).toEqual([]);
    expect(answered.rebuilds).toHaveLength(2);
  });

  it('a word that nobody knows goes to “other” as a guess, and can be named', () => {
    const text = list('2020-01-02,13 F-150,Widgets,door,10.00');
    expect(linesOf(read(text))).toMatchObject([{ category: 'other', isGuess: true }]);
    expect(linesOf(read(text, { answers: { 'category:widgets': 'parts' } }))).toMatchObject([
      { category: 'parts', isGuess: false },
    ]);
  });

  it('a block pasted twice is put aside, or counted when someone says so; honest repeats stay', () => {
    const block = [
      '2020-01-02,13 F-150,Parts,door,10.00',
      '2020-01-03,13 F-150,Parts,hood,20.00',
      '2020-01-04,13 F-150,Parts,lamp,30.00',
    ];
    const text = list(...block, ...block);
    expect(read(text)).toMatchObject({ asideCount: 3, control: { costCents: 6000, putAsideCents: 6000 } });
    expect(read(text, { answers: { duplicate: 'twice' } }).control.costCents).toBe(12_000);
    expect(read(list(block[0] ?? '', block[0] ?? '', block[0] ?? '')).control.costCents).toBe(3000);
  });

  it('a column of amounts that nothing explains is asked about, not counted in silence', () => {
    const text = [
      'Stock,Year,Model,Bid,Parts,Gizmo',
      'A1,2012,Jetta,100.00,20.00,7.00',
      'A2,2013,Golf,200.00,30.00,8.00',
      'A3,2014,Soul,300.00,40.00,9.00',
    ].join('\n');
    const [choice] = read(text).choices;
    expect(choice).toMatchObject({ kind: 'columns', column: 'Gizmo', mustAsk: true });
    expect(read(text, { answers: { [choice?.id ?? '']: 'cost' } }).control.centsByCategory).toEqual({
      purchase: 60_000,
      parts: 9000,
      other: 2400,
    });
  });
});

describe('one expense per row', () => {
  it('says by how much a total differs, and whether rows put aside explain it', () => {
    const reading = read(
      list(
        '2020-01-02,13 F-150,Parts,door,10.00',
        '2020-01-03,,Parts,hood,20.00',
        ',,,total,30.00',
        '2020-02-02,13 F-150,Parts,door,11.00',
        ',,,total,12.00',
      ),
    );
    expect(reading.statedTotals).toMatchObject([
      { row: 4, stated: 3000, imported: 1000, putAside: 2000, explanation: expect.stringContaining('put aside') },
      {
        row: 6,
        stated: 1200,
        imported: 1100,
        putAside: 0,
        explanation: expect.stringContaining('differs from its own rows'),
      },
    ]);
  });

  it('books what belongs to no car as overhead', () => {
    expect(
      linesOf(read(list('2020-01-02,shop,Supplies,rags,10.00', '2020-01-02,13 F-150,Parts,door,10.00'))),
    ).toMatchObject([{ rebuild: null, cents: 1000 }, { rebuild: 0 }]);
  });

  it('takes a refund as negative, and money in the sale column of a part as a refund too', () => {
    const text = [
      'Date,Car,Category,Paid,Sale',
      '2020-01-02,13 F-150,Parts,10.00,',
      '2020-01-05,13 F-150,Parts,,4.00',
      '2020-03-02,13 F-150,Sold,,"3,000.00"',
    ].join('\n');
    expect(linesOf(read(text)).map(({ kind, cents }) => [kind, cents])).toEqual([
      ['entry', 1000],
      ['entry', -400],
      ['sale', 300_000],
    ]);
  });

  it('puts single amounts of another currency aside', () => {
    const reading = read(
      list(
        '2020-01-02,13 F-150,Parts,door,$10.00',
        '2020-01-03,13 F-150,Parts,hood,$20.00',
        '2020-01-03,13 F-150,Parts,lamp,€30.00',
      ),
    );
    expect(reading.asides).toMatchObject([{ row: 4, col: 5, reason: 'currency' }]);
  });

  it('puts a row with broken quotation marks aside, and a text that is too long', () => {
    const reading = read(
      list(
        '2020-01-02,13 F-150,Parts,"door" shell",10.00',
        `2020-01-03,13 F-150,Parts,${'x'.repeat(501)},20.00`,
        '2020-01-04,13 F-150,Parts,lamp,30.00',
      ),
    );
    expect(reading.asides.map((aside) => aside.reason)).toEqual(['malformed-row', 'cell-too-long']);
    expect(reading.control.costCents).toBe(3000);
  });
});

it('refuses a file in which a broken quotation mark swallows rows', () => {
  const rows = Array.from(
    { length: 9 },
    (_, i) => `2020-01-0${i + 1},13 F-150,Parts,${i === 1 ? '"door" shell' : i === 7 ? '"hood, used"' : 'lamp'},10.00`,
  );
  expect(read(list(...rows)).refusal).toMatchObject({ kind: 'unclosed-quote', row: 3 });
});

describe('how a file is written', () => {
  const rows = [
    'Date;Car;What for;Details;Paid',
    '2020-01-02;13 F-150;Parts;Tür, links;1.234,50',
    '2020-01-03;13 F-150;Parts;Öl;0,50',
  ];
  const latin = Buffer.from(rows.join('\r\n').replace('Tür', 'T\xfcr').replace('Öl', '\xd6l'), 'latin1');
  it.each([
    ['UTF-8', Buffer.from(rows.join('\n'))],
    ['UTF-8 with its mark and old line ends', Buffer.from(`\uFEFF${rows.join('\r')}`)],
    ['UTF-16', Buffer.from(`\uFEFF${rows.join('\r\n')}`, 'utf16le')],
    ['UTF-16 without its mark', Buffer.from(rows.join('\r\n'), 'utf16le')],
    ['Windows-1252', latin],
    ['a sep= line above', Buffer.from(`sep=;\n${rows.join('\n')}`)],
  ])('%s comes in the same', (_, bytes) => {
    const reading = read(bytes);
    expect(linesOf(reading).map(({ what, cents }) => [what, cents])).toEqual([
      ['Tür, links', 123_450],
      ['Öl', 50],
    ]);
  });
});
