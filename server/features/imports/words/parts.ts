import { fold } from '../cells/fold.ts';

// Things that are bolted to a vehicle, in the languages that files come in. Folded.
const PARTS = new Set(
  `headlight headlamp taillight grille bumper hood bonnet fender door mirror radiator condenser strut shock tie rod wheel rim
tire tyre battery alternator starter windshield quarter glass airbag pretensioner seatbelt hinge latch bracket clips fasteners wiring
pigtail sensor module hose belt pump filter caliper rotor pads exhaust muffler axle hub bearing arm panel liner trim seat trunk lid
tailgate spoiler core support subframe engine transmission motor scheinwerfer ruckleuchte stossfanger stossstange kotflugel
motorhaube heckklappe tur spiegel kuhler lenker querlenker felge stahlfelge frontmaske clips kleinteile faro piloto parachoques
capo aleta puerta espejo retrovisor radiador rueda llanta bateria bomba phare feu calandre parechoc capot aile porte retroviseur
radiateur roue jante batterie pompe amortisseur`.split(/\s+/),
);

/** Does a text name a part of a vehicle? Several parts of it may stand in the plural. */
export function namesPart(text: string): boolean {
  return fold(text)
    .split(' ')
    .some((word) => PARTS.has(word) || (word.endsWith('s') && PARTS.has(word.slice(0, -1))));
}
