import { fold } from '../cells/fold.ts';

// Makes and the shorter names people use for them: name | other names.
const MAKES = `Acura|Alfa Romeo,alfa|Audi|BMW|Buick|Cadillac|Chevrolet,chevy,chev|Chrysler|Citroën|Dacia|Daewoo|Daihatsu|Dodge|Fiat|
Ford|Genesis|GMC|Honda|Hummer|Hyundai|Infiniti|Isuzu|Jaguar|Jeep|Kia|Lada|Lancia|Land Rover,landrover|Lexus|Lincoln|Lotus|Maserati|Mazda|
Mercedes,mercedes benz,benz|Mercury|Mini|Mitsubishi|Nissan|Oldsmobile,olds|Opel|Peugeot|Plymouth|Pontiac|Porsche|Ram|Renault|
Saab|Saturn|Scion|Seat|Škoda|Smart|SsangYong|Subaru|Suzuki|Tesla|Toyota|Vauxhall|Volkswagen,vw|Volvo`;

const COLORS = `red blue green black white silver gray grey gold tan brown orange yellow purple maroon beige burgundy champagne
rot blau grun schwarz weiss silber grau gold braun orange gelb lila beige rojo azul verde negro blanco plata gris
rouge bleu vert noir blanc argent`;

const MAKE_OF = new Map(
  MAKES.replace(/\n/g, '')
    .split('|')
    .flatMap((entry) => {
      const [name = '', ...others] = entry.split(',');
      return [name, ...others].map((word) => [fold(word), name] as const);
    }),
);
const COLOR_WORDS = new Set(COLORS.split(/\s+/));
const OVERHEAD_WORDS = new Set([
  'overhead',
  'shop',
  'general',
  'none',
  'no car',
  'all cars',
  'werkstatt',
  'allgemein',
  'taller',
  'atelier',
]);

/** The make that a word stands for, as it is usually written; null = no make. */
export function makeOf(words: string): string | null {
  return MAKE_OF.get(fold(words)) ?? null;
}

export function isColor(word: string): boolean {
  return COLOR_WORDS.has(fold(word));
}

// The same color in other words, and shades that people mix up.
const SAME_COLORS = [
  'red rot rojo rouge maroon burgundy',
  'blue blau azul bleu',
  'green grun verde vert',
  'black schwarz negro noir',
  'white weiss blanco blanc',
  'silver silber plata gray grey grau gris argent',
  'gold tan beige champagne braun brown',
  'yellow gelb',
  'purple lila',
].map((words) => words.split(' '));

/** The color that a word names, in one language; null = no color. */
export function colorOf(word: string): string | null {
  const color = fold(word);
  if (!COLOR_WORDS.has(color)) return null;
  return SAME_COLORS.find((words) => words.includes(color))?.[0] ?? color;
}

/** Does the vehicle cell say that a cost belongs to no vehicle? */
export function isOverhead(text: string): boolean {
  return OVERHEAD_WORDS.has(fold(text));
}
