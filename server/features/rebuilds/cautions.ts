import type { Caution } from '#shared/contracts/rebuild-outcome.ts';

/** What of a rebuild can bring up a caution: words of its damage, class, cost categories and entries. */
export interface CautionFacts {
  readonly damages: readonly string[];
  /** Categories with an entry or a planned amount. */
  readonly categories: readonly string[];
  /** What its entries say they bought. */
  readonly entries: readonly string[];
}

const RULE = 'Follow the maker’s procedure, local inspection law and licensed practice.';

const RESTRAINTS =
  'Airbags and belts: note new or used, part number and the donor’s VIN; check for recalls; the lamp must go off at key-on. Beware of counterfeit inflators.';

interface Trigger {
  readonly about: string;
  readonly words: RegExp;
  readonly of: keyof CautionFacts;
  readonly text: string;
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

const ASKED: readonly Caution[] = [
  {
    about: 'roadworthy',
    asked: 'roadworthyOn',
    text: `Before it goes on the road: restraints, brakes, steering and open recalls all done? ${RULE}`,
  },
  {
    about: 'listing',
    asked: 'listedOn',
    text: `Before it is offered: nothing open on restraints, brakes, steering or recalls, and the title’s brand told to buyers? ${RULE}`,
  },
  {
    about: 'sale',
    asked: 'soldOn',
    text: `At the sale: odometer and title brand told in writing? ${RULE}`,
  },
];

/** Cautions for the kind of work on a rebuild (one of each), then those that the marking of a date brings up. */
export function cautionsFor(facts: CautionFacts): Caution[] {
  const raised = new Map<string, Caution>();
  for (const { about, words, of, text } of TRIGGERS) {
    if (facts[of].some((word) => words.test(word))) raised.set(about, { about, text: `${text} ${RULE}`, asked: null });
  }
  return [...raised.values(), ...ASKED];
}
