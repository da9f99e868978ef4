/**
 * What hides behind a kind of damage, and how to tell before buying: common knowledge of the trade, in our own words.
 * It stands below the shop's own surprises, as a list to tick while walking round the car.
 */
export interface TradeCheck {
  /** Kept with a sheet when ticked: never changed once given. */
  readonly key: string;
  readonly surprise: string;
  readonly look: string;
}

export interface DamageFamily {
  readonly name: string;
  /** A damage of the shop's own list belongs here if its name holds one of these words. */
  readonly words: RegExp;
  readonly checks: readonly TradeCheck[];
}

const check = (key: string, surprise: string, look: string): TradeCheck => ({ key, surprise, look });

const RESTRAINTS = 'Airbags, belts and their control module';
const RESTRAINTS_LOOK =
  'Lamp at key-on, cuts in seat covers and dash skin, a belt that does not pull back; ask whether the inflators are recalled.';

export const DAMAGE_FAMILIES: readonly DamageFamily[] = [
  {
    name: 'front',
    words: /front|nose/i,
    checks: [
      check(
        'front-cooling',
        'Radiator, condenser or fan; engine run hot',
        'A trail of coolant under the car, the shroud pushed against the engine, a video of it running that stops early.',
      ),
      check(
        'front-support',
        'Radiator support, hood hinges and latch, lamp mounts',
        'An uneven hood gap, tape over the latch, lamps in place with their tabs gone.',
      ),
      check(
        'front-structure',
        'Lower rail, apron or strut tower shifted',
        'A wheel set back in its arch (measure both sides), a door gap that changes, a wrinkle behind the lamp.',
      ),
      check('front-restraints', RESTRAINTS, RESTRAINTS_LOOK),
      check('front-ac', 'Air conditioning open to the air', 'An oily stain at the condenser, no pressure left.'),
    ],
  },
  {
    name: 'rear',
    words: /rear|back end|tail|trunk/i,
    checks: [
      check(
        'rear-floor',
        'Trunk floor, rear rail, bumper beam, parking sensors, latch',
        'Wrinkles in the spare-wheel well, an uneven gate gap, a fuel flap that no longer lines up.',
      ),
    ],
  },
  {
    name: 'side',
    words: /side|door|quarter|t-?bone/i,
    checks: [
      check(
        'side-pillar',
        'Rocker, hinge pillar, axle or wheel bearing',
        'A wheel that leans, a door that sags, a steering wheel off center.',
      ),
      check(
        'side-structure',
        'Rail or apron pushed from the side',
        'Measure wheel to arch on both sides; look along the door gaps.',
      ),
      check('side-restraints', `${RESTRAINTS}, curtain bags with them`, RESTRAINTS_LOOK),
    ],
  },
  {
    name: 'rollover',
    words: /roll|roof/i,
    checks: [
      check(
        'rollover-roof',
        'Roof skin, pillars, windshield frame',
        'Gaps at the tops of the doors, glass that does not follow its frame.',
      ),
      check(
        'rollover-oil',
        'Oil in the cylinders from lying upside down',
        'Do not crank it; ask how long it lay on its roof.',
      ),
      check('rollover-restraints', RESTRAINTS, RESTRAINTS_LOOK),
    ],
  },
  {
    name: 'hail',
    words: /hail/i,
    checks: [
      check(
        'hail-edges',
        'Dents that cannot be pushed, or only with the headliner out',
        'Dents on rails and edges, aluminum panels, broken paint, a glass roof, a roof rack.',
      ),
    ],
  },
  {
    name: 'flood',
    words: /flood|water|submer/i,
    checks: [
      check(
        'flood-wiring',
        'Wet body computer, green pins, wiring that fails later',
        'Silt in fuse box and lamps, a musty or perfumed cabin, damp under the carpet and in the spare-wheel well.',
      ),
      check(
        'flood-engine',
        'Seat and airbag modules gone, engine took in water',
        'The height of the water line, milky oil, an engine that does not turn.',
      ),
      check(
        'flood-high-voltage',
        'High-voltage battery that was under water (hybrid, electric)',
        'A water line above the floor: leave it to people trained for it.',
      ),
    ],
  },
  {
    name: 'underbody',
    words: /under ?body|undercarriage|bottom/i,
    checks: [
      check(
        'underbody-high-voltage',
        'High-voltage battery case hit (hybrid, electric)',
        'Scrapes or dents in the case: leave it to people trained for it.',
      ),
      check('underbody-lines', 'Oil pan, subframe, brake and fuel lines', 'A photo from below; drops under the car.'),
    ],
  },
  {
    name: 'theft',
    words: /theft|stolen|vandal/i,
    checks: [
      check('theft-ignition', 'Column, ignition, keys and immobilizer', 'Count the keys; look at the column cover.'),
      check(
        'theft-missing',
        'Wheels, seats, converter or radio missing',
        'Look under and inside; photos often leave it out.',
      ),
      check('theft-wiring', 'Wiring cut', 'Look behind radio and lamps, under the dash.'),
    ],
  },
  {
    name: 'fire',
    words: /fire|burn/i,
    checks: [
      check(
        'fire-wiring',
        'Wiring melted beyond what shows, brittle plugs',
        'Where the paint blisters end; tug the insulation beyond it.',
      ),
      check('fire-smell', 'Smoke in the cabin', 'Smell the cabin after it was closed for a while.'),
    ],
  },
];

/** Looked at on every car, whatever hit it. */
export const ANY_DAMAGE: readonly TradeCheck[] = [
  check(
    'any-older',
    'Older damage and filler',
    'Paint depth from panel to panel; date codes of glass and lamps that do not match.',
  ),
  check(
    'any-wear',
    'Worn out: transmission, catalyst, tires, rust',
    'A cold start, a scan, a photo from below, an odometer that fits the wear.',
  ),
  check(
    'any-paper',
    'Title: brand, lien, another state, a missing signature',
    'Read both sides of the title before bidding.',
  ),
  check(
    'any-photos',
    'Glass, interior and the far side, left out of the photos',
    'Walk all the way round; sit inside.',
  ),
];

/** Work that as a rule brings other work with it. */
export const GOES_TOGETHER: readonly { readonly key: string; readonly work: string; readonly also: string }[] = [
  { key: 'with-hood', work: 'Hood replaced', also: 'its hinges and latch too' },
  { key: 'with-bags', work: 'Airbags blown', also: 'control module reset or replaced, belts rebuilt' },
  { key: 'with-cooling', work: 'Cooling or AC parts off', also: 'evacuate and recharge, by a certified person' },
  { key: 'with-keys', work: 'No keys with the lot', also: 'a locksmith: cut and programmed, two of them' },
  { key: 'with-steering', work: 'Steering or suspension touched', also: 'alignment' },
  { key: 'with-panels', work: 'New panels beside old paint', also: 'polish or blend the next panel' },
  { key: 'with-glass', work: 'Glass with a camera', also: 'calibration' },
  { key: 'with-drive', work: 'The first real drive', also: 'wheel bearings, brakes and tires show only then' },
];

/** The checks for a car by the names of its damages, first those of its damage, then those of every car; each once. */
export function tradeChecks(damages: readonly (string | null | undefined)[]): TradeCheck[] {
  const families = DAMAGE_FAMILIES.filter(({ words }) => damages.some((name) => name != null && words.test(name)));
  return [...families.flatMap(({ checks }) => checks), ...ANY_DAMAGE];
}
