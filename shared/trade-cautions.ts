import { tradeChecks } from './trade-checks.ts';

/** What of a car can bring up a caution: words of its damage, its cost categories and its entries. */
export interface CautionFacts {
  readonly damages: readonly string[];
  /** Categories with an entry or a planned amount. */
  readonly categories: readonly string[];
  /** What its entries say they bought. */
  readonly entries: readonly string[];
}

export interface TradeCaution {
  readonly about: string;
  readonly text: string;
}

/** Ends every caution. */
export const FOLLOW_PROCEDURE = 'Follow the maker’s procedure, local inspection law and licensed practice.';

const RESTRAINTS =
  'Airbags and belts: note new or used, part number and the donor’s VIN; check for recalls; the lamp must go off at key-on. Beware of counterfeit inflators.';

const STRUCTURE =
  'Structure: rails, pillars and roof carry the next crash. Have it measured, and repaired where the maker allows it.';

interface Trigger extends TradeCaution {
  readonly words: RegExp;
  readonly of: keyof CautionFacts;
}

const TRIGGERS: readonly Trigger[] = [
  {
    about: 'restraints',
    words: /restraint|\bsrs\b|air ?bag|belt/i,
    of: 'categories',
    text: RESTRAINTS,
  },
  {
    about: 'restraints',
    words: /air ?bag|inflator|pretensioner|seat ?belt|\bsrs\b|clock ?spring/i,
    of: 'entries',
    text: RESTRAINTS,
  },
  { about: 'structure', words: /roll|roof|frame|structur/i, of: 'damages', text: STRUCTURE },
  { about: 'structure', words: /\b(rail|apron|pillar|strut tower|frame)s?\b/i, of: 'entries', text: STRUCTURE },
  {
    about: 'flood and underbody',
    words: /flood|water|under ?body/i,
    of: 'damages',
    text: 'Water or a blow from below: a hybrid or electric car may catch fire days or weeks later. Keep it 50 ft from buildings and other cars, do not charge or drive it; trained people only. Lift on a firm base and block it at once.',
  },
  {
    about: 'fire',
    words: /fire|burn/i,
    of: 'damages',
    text: 'Fire damage: wiring, fuel lines and restraints may be spoiled beyond what shows; burnt parts and residue are harmful to touch and breathe.',
  },
  {
    about: 'refrigerant',
    words: /refrigerant|\ba\/?c\b|air ?con|condenser/i,
    of: 'entries',
    text: 'Air conditioning: refrigerant may only be handled by certified people with approved equipment, and never vented.',
  },
  {
    about: 'paint',
    words: /paint/i,
    of: 'categories',
    text: 'Paint in the shop: clear coats with isocyanates need supplied air; spraying is regulated.',
  },
];

/** Cautions for the kind of work on a car, one of each. */
export function tradeCautions(facts: CautionFacts): TradeCaution[] {
  const raised = new Map<string, TradeCaution>();
  for (const { about, words, of, text } of TRIGGERS) {
    if (facts[of].some((word) => words.test(word))) raised.set(about, { about, text: `${text} ${FOLLOW_PROCEDURE}` });
  }
  return [...raised.values()];
}

/** Cautions for a car that is only looked at yet: by its damages and what hides behind them, and what is planned. */
export function bidCautions({ damages, categories }: Pick<CautionFacts, 'damages' | 'categories'>): TradeCaution[] {
  const hidden = tradeChecks(damages).map(({ surprise }) => surprise);
  return tradeCautions({ damages, categories, entries: hidden });
}

/** On the walk round a car, before anybody works on it: what may hurt on the spot, whatever hit it. */
export const WALK_ROUND_CAUTION =
  'Never go under a car on a jack alone. Keep away from a hybrid or electric car that was flooded or hit from below. Bags and belts that did not fire still can.';
