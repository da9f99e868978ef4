import type { Caution } from '#shared/contracts/rebuild-outcome.ts';
import { type CautionFacts, FOLLOW_PROCEDURE, tradeCautions } from '#shared/trade-cautions.ts';

const ASKED: readonly Caution[] = [
  {
    about: 'roadworthy',
    asked: 'roadworthyOn',
    text: `Before it goes on the road: restraints, brakes, steering and open recalls all done? ${FOLLOW_PROCEDURE}`,
  },
  {
    about: 'listing',
    asked: 'listedOn',
    text: `Before it is offered: nothing open on restraints, brakes, steering or recalls, and the title’s brand told to buyers? ${FOLLOW_PROCEDURE}`,
  },
  {
    about: 'sale',
    asked: 'soldOn',
    text: `At the sale: odometer and title brand told in writing? ${FOLLOW_PROCEDURE}`,
  },
];

/** Cautions for the kind of work on a rebuild (one of each), then those that the marking of a date brings up. */
export function cautionsFor(facts: CautionFacts): Caution[] {
  return [...tradeCautions(facts).map((caution) => ({ ...caution, asked: null })), ...ASKED];
}
