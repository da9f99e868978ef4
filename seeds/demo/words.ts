import type { DemoClass, DemoDamage } from './parameters.ts';

/** Makes and models are plain facts; vendors, people and places are invented. */
export const MODELS: Readonly<Record<DemoClass, readonly (readonly [make: string, model: string])[]>> = {
  'compact car': [
    ['Honda', 'Civic'],
    ['Toyota', 'Corolla'],
    ['Mazda', 'Mazda3'],
    ['Hyundai', 'Elantra'],
    ['Ford', 'Focus'],
    ['Kia', 'Forte'],
    ['Nissan', 'Sentra'],
    ['Subaru', 'Impreza'],
  ],
  'midsize car': [
    ['Toyota', 'Camry'],
    ['Honda', 'Accord'],
    ['Nissan', 'Altima'],
    ['Hyundai', 'Sonata'],
    ['Ford', 'Fusion'],
    ['Mazda', 'Mazda6'],
    ['Kia', 'Optima'],
    ['Chevrolet', 'Malibu'],
  ],
  'small SUV': [
    ['Toyota', 'RAV4'],
    ['Honda', 'CR-V'],
    ['Subaru', 'Forester'],
    ['Ford', 'Escape'],
    ['Mazda', 'CX-5'],
    ['Nissan', 'Rogue'],
    ['Hyundai', 'Tucson'],
    ['Kia', 'Sportage'],
  ],
  'standard SUV': [
    ['Ford', 'Explorer'],
    ['Honda', 'Pilot'],
    ['Toyota', 'Highlander'],
    ['Chevrolet', 'Traverse'],
  ],
  minivan: [
    ['Toyota', 'Sienna'],
    ['Honda', 'Odyssey'],
    ['Dodge', 'Grand Caravan'],
    ['Kia', 'Sedona'],
  ],
  'standard pickup': [
    ['Ford', 'F-150'],
    ['Chevrolet', 'Silverado'],
    ['Ram', '1500'],
    ['Toyota', 'Tundra'],
    ['GMC', 'Sierra'],
  ],
};

export const COLORS = ['silver', 'white', 'blue', 'black', 'gray', 'red', 'green', 'tan'] as const;

export const SELLERS = ['Quillhaven Salvage Sale', 'Tarrowmere Auto Auction', 'Ottermere Insurance Lot'] as const;
export const CHANNELS = ['private, local ad', 'private, online ad', 'word of mouth', 'small dealer'] as const;

export const PART_VENDORS = [
  'Hobnail Used Parts',
  'Dwindle & Daughter Breakers',
  'Pebblewick Crash Parts',
  'Junction Parts Counter',
  'online',
  'Fennimoor Auto Recyclers',
] as const;

export const PARTS: Readonly<Record<DemoDamage, readonly string[]>> = {
  front: [
    'hood, used',
    'bumper cover',
    'headlamp left',
    'headlamp right',
    'radiator',
    'condenser',
    'fan assembly',
    'fender left',
    'grille and clips',
    'radiator support',
    'bumper beam',
    'splash shields',
    'washer bottle',
  ],
  rear: [
    'trunk lid, used',
    'bumper cover rear',
    'tail lamp left',
    'tail lamp right',
    'bumper beam rear',
    'park sensors',
    'muffler',
    'clips and fasteners',
  ],
  side: [
    'door shell front',
    'door shell rear',
    'mirror',
    'rocker panel',
    'door glass',
    'wheel, used',
    'control arm',
    'trim and clips',
  ],
  hail: ['windshield moulding', 'roof rack rails', 'headliner clips', 'hood, used', 'tail lamp', 'cowl panel'],
  theft: [
    'ignition cylinder',
    'steering column cover',
    'door handle',
    'wheels, set of four',
    'radio',
    'seat, used',
    'converter',
  ],
  flood: [
    'carpet, used',
    'seat set, used',
    'body computer',
    'starter',
    'alternator',
    'connectors and terminals',
    'all fluids and filters',
  ],
  rollover: [
    'roof skin',
    'windshield',
    'door shell',
    'mirror pair',
    'quarter glass',
    'hood, used',
    'wheel and tire',
    'oil and filters',
  ],
  fire: [
    'engine harness, used',
    'hood, used',
    'battery and cables',
    'intake plastics',
    'headlamp pair',
    'insulation',
    'fuse box',
  ],
};

export const SURPRISES: Readonly<Record<DemoDamage, readonly string[]>> = {
  front: [
    'lower rail pushed, frame pull',
    'radiator support cracked behind the lamp',
    'AC line torn at the firewall',
    'strut tower shifted',
    'engine mount broken',
  ],
  rear: ['trunk floor buckled', 'rear rail kinked', 'fuel filler neck bent'],
  side: ['hinge pillar in', 'rear axle bent', 'curtain bag sensor dead'],
  hail: ['dents on the roof rail, cannot be pushed', 'windshield cracked at the edge'],
  theft: ['immobilizer locked out', 'transmission lever forced', 'converter cut, second sensor too'],
  flood: ['silt in the fuse box', 'airbag module corroded', 'seat modules dead', 'water in the gearbox'],
  rollover: ['windshield frame out of square', 'oil in two cylinders', 'A-pillar skin split'],
  fire: ['loom melted further than seen', 'brake booster cooked', 'smoke smell, headliner out'],
};

export const SMALL_JOBS = [
  ['second key, cut and programmed', 'Ottermere Lock & Key'],
  ['AC evacuate and recharge', 'Junction Cooling'],
  ['windshield, fitted', 'Ottermere Glass'],
  ['four-wheel alignment', 'Ottermere Alignment'],
  ['scan and clear codes', 'Ottermere Alignment'],
  ['camera calibration', 'Ottermere Glass'],
] as const;

export const RESTRAINT_JOBS = [
  ['belt pretensioners, rebuilt', 'Brightloom Belt & Bag'],
  ['control module, reset', 'Brightloom Belt & Bag'],
  ['driver bag, new', 'Pebblewick Crash Parts'],
  ['clock spring', 'Junction Parts Counter'],
] as const;

export const PAINT_JOBS = ['base and clear, panels as quoted', 'blend into next panel', 'prime and block'] as const;
export const PAINT_SHOP = 'Saltgrass Refinish';

export const EXTRAS = ['better stereo', 'tow hitch', 'all-weather mats', 'new floor speakers', 'nicer wheels'] as const;
