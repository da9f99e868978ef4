import { fold } from '../cells/fold.ts';

// Things that are bolted to a vehicle, in the languages that files come in. Folded.
const PARTS = new Set(
  `headlight headlamp taillight grille bumper hood bonnet fender door mirror radiator condenser strut shock tie rod wheel rim
tire tyre battery alternator starter windshield quarter glass airbag pretensioner seatbelt hinge latch bracket clips fasteners wiring
pigtail sensor module hose belt pump filter caliper rotor pads exhaust muffler axle hub bearing arm panel liner trim seat trunk lid
tailgate spoiler core support subframe engine transmission motor scheinwerfer ruckleuchte stossfanger stossstange kotflugel
motorhaube heckklappe tur spiegel kuhler lenker querlenker felge stahlfelge frontmaske clips kleinteile faro piloto parachoques
capo aleta puerta espejo retrovisor radiador rueda llanta bateria bomba phare feu calandre parechoc capot aile porte retroviseur
radiateur roue jante batterie pompe amortisseur bumpers fuse relay compressor intercooler turbo injector coil plug plugs gasket
thermostat catalytic converter manifold carburetor throttle clutch flywheel driveshaft differential spindle knuckle sway strut coilover
visor console dash dashboard carpet mat mats antenna horn wiper wipers moulding molding emblem badge glovebox steering column lamp lights
light lens foglight foglamp fog skid splash shield valance apron rail pillar rocker quarter hatch liftgate gate bed cap tonneau bezel
heckleuchte blinker nebelscheinwerfer stossdampfer feder bremse bremsen bremsscheibe bremsbelage zahnriemen auspuff lichtmaschine anlasser
kupplung getriebe reifen sitz gurtstraffer steuergerat sensor schloss griff leiste dichtung querlenker radlager achse antriebswelle
frontstossstange heckstossstange dachhimmel windschutzscheibe airbagmodul
rueda neumatico amortiguador freno frenos pastillas disco discos correa embrague alternador arranque escape luna cristal manguito sensor
cerradura maneta travesano brazo buje rotula asiento volante salpicadero optica intermitente paragolpes portezuela maletero porton
frein freins plaquettes disque courroie embrayage alternateur demarreur echappement pare brise vitre serrure poignee rotule siege
optique clignotant coffre hayon traverse triangle cardan bouclier retroviseurs phares`.split(/\s+/),
);

/** Does a text name a part of a vehicle? Several parts of it may stand in the plural. */
export function namesPart(text: string): boolean {
  return fold(text)
    .split(' ')
    .some((word) => PARTS.has(word) || (word.endsWith('s') && PARTS.has(word.slice(0, -1))));
}
