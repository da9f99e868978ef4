import type { CheckedAnswer, CheckGrade, CheckKind } from '#shared/contracts/checks.ts';

interface Words {
  readonly title: string;
  /** What it does to the answers. */
  readonly effect: string;
  /** The way to mend it. */
  readonly mend: string;
}

export const CHECK_WORDS: Readonly<Record<CheckKind, Words>> = {
  'receipt twice': {
    title: 'The same bill twice',
    effect: 'If it is one bill, its cost counts twice and the rebuild looks worse than it was.',
    mend: 'Open the entries and void the one too many. Two honest equal bills: say that it is right.',
  },
  'refund as cost': {
    title: 'A refund booked as a cost',
    effect: 'It was added where it should have been taken off, so it weighs twice its amount.',
    mend: 'Open the entry and put a minus before the amount.',
  },
  'vehicle twice': {
    title: 'One vehicle number on two rebuilds',
    effect: 'If it is one vehicle, its costs and its sale lie apart and both rebuilds mislead.',
    mend: 'Correct the number on one of them, or move the entries to one rebuild.',
  },
  'rows put aside': {
    title: 'Rows of a file that did not come in',
    effect: 'Their money stands in no figure until they are entered.',
    mend: 'Open the file, and enter what was put aside in the ledger.',
  },
  'long day': {
    title: 'More than twelve hours in one day',
    effect: 'A clock left running makes the work look slow and the hour look cheap.',
    mend: 'Open the hours and put in what was worked.',
  },
  'no purchase price': {
    title: 'No purchase price',
    effect: 'Without it nothing can be said of profit: left out of every money figure.',
    mend: 'Open the rebuild and fill in what it was bought for.',
  },
  'no purchase day': {
    title: 'No purchase day',
    effect: 'Nobody can tell since when its money was tied up, or which rule was known when it was bought.',
    mend: 'Open the rebuild and fill in the day.',
  },
  'no estimate': {
    title: 'No estimate',
    effect: 'Nothing to hold the outcome against: left out of every overrun and every rule.',
    mend: 'For rebuilds to come, lock an estimate before work starts. One made up afterwards says nothing.',
  },
  'estimate written over': {
    title: 'Estimate written over with what it came to',
    effect: 'It would show no overrun at all, so it is left out.',
    mend: 'If the first plan still stands on paper, enter it as the estimate. Otherwise leave it: it is counted here.',
  },
  'no own hours': {
    title: 'No own hours',
    effect: 'Left out of every figure by the hour.',
    mend: 'Enter the hours, even as one honest total without a day.',
  },
  'no planned hours': {
    title: 'No planned hours',
    effect: 'Left out of how far hours run over.',
    mend: 'Plan hours with the estimate from now on.',
  },
  'no listing day': {
    title: 'Sold, and no listing day',
    effect: 'Left out of the days to sell.',
    mend: 'Open the rebuild and fill in when it was first offered.',
  },
  'dates out of order': {
    title: 'Dates out of order',
    effect: 'A later stage lies before an earlier one: left out of the days to sell.',
    mend: 'Open the rebuild and look which day slipped.',
  },
  'no class': {
    title: 'No vehicle class',
    effect: 'It stands in no row of what pays, nor in a rule for its class.',
    mend: 'Open the rebuild and choose a class.',
  },
  'no damage': {
    title: 'No damage type',
    effect: 'It stands in no column of what pays, nor in a rule for its damage.',
    mend: 'Open the rebuild and choose the damage.',
  },
  'foreseen not said': {
    title: 'Entries that do not say whether they were foreseen',
    effect: 'The rebuild is left out of surprise rates and of the two-part rule.',
    mend: 'Open its entries and mark each as foreseen or surprise, as far as you remember.',
  },
  'seen not said': {
    title: 'Nobody said whether it was seen before buying',
    effect: 'Left out where seen is held against unseen, and in rules that ask for it.',
    mend: 'Open the rebuild and say it.',
  },
  'entry without a day': {
    title: 'Entries without a day',
    effect: 'Its amounts count, but its annual return cannot be worked out.',
    mend: 'Open the entries without a day and fill in what you know.',
  },
  'entry before purchase': {
    title: 'Entries dated before the purchase',
    effect: 'A trip to look at it is honest. A slip in the day bends the annual return.',
    mend: 'Open the entry and look at its day.',
  },
  'day to come': {
    title: 'Entries dated after today',
    effect: 'They count on their rebuild already, and in the year only when the day comes.',
    mend: 'Open the entry and look at its day.',
  },
  'thin estimate': {
    title: 'Most of the cost was never planned',
    effect: 'The overrun is right and says more about the estimate than about the work.',
    mend: 'Plan every category next time, with 0 where nothing is needed.',
  },
  'guessed figure': {
    title: 'Amounts that the file said only roughly',
    effect: 'They count as they were read, and may be off.',
    mend: 'Find the bill and correct the entry, or say that it is right.',
  },
  'vehicle number': {
    title: 'Vehicle numbers that do not check',
    effect:
      'No answer depends on it. A misread number finds no title and no recall. Old and foreign numbers may fail and be right.',
    mend: 'Hold it against the plate or the title.',
  },
};

export const GRADE_WORDS: Readonly<Record<CheckGrade, { title: string; note: string }>> = {
  wrong: { title: 'Figures may be wrong', note: 'Money or hours that may count too often, or not at all.' },
  'left out': {
    title: 'Left out of an answer',
    note: 'Nothing is wrong; an answer rests on fewer rebuilds than it could.',
  },
  unsure: { title: 'Worth a look', note: 'Figures that count and may be less sure than they look.' },
};

export const ANSWER_NAMES: Readonly<Record<CheckedAnswer, string>> = {
  year: 'Year',
  'what-pays': 'What pays',
  overruns: 'Overruns',
  'time-to-sell': 'Time to sell',
  contingency: 'Contingency',
};
