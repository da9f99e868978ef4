import { fold } from '../cells/fold.ts';
import { colorOf } from '../words/vehicles.ts';
import type { VehicleDoubt, VehicleGroup } from './vehicle-groups.ts';

type Target = VehicleGroup | 'ambiguous' | 'aside';

interface Grouped {
  readonly of: Map<string, Target>;
  readonly groups: VehicleGroup[];
  readonly doubts: VehicleDoubt[];
}

/**
 * Takes spellings out of the groups that they were put into, as a person said of any of them ('own', 'aside', or the id of
 * another group), and those of another color than the rest, which are likely another car: they are asked about.
 */
export function splitGroups(
  grouped: Grouped,
  counts: ReadonlyMap<string, number>,
  answers: ReadonlyMap<string, string>,
): void {
  const asked = new Set(grouped.doubts.map(({ spelling }) => spelling));
  // Those that leave their group make groups of their own meanwhile.
  const whole = grouped.groups.slice();
  for (const group of whole) {
    for (const spelling of otherColors(group, counts)) {
      grouped.doubts.push({ spelling, taken: null, others: [group], why: 'It is another color.', preset: 'own' });
      move(grouped, spelling, answers.get(spelling) ?? 'own', counts);
      asked.add(spelling);
    }
  }
  // Those of their own first, so that others can join them.
  const said = [...answers].filter(([spelling]) => grouped.of.has(spelling) && !asked.has(spelling));
  for (const [spelling, answer] of said) if (answer === 'own') move(grouped, spelling, answer, counts);
  for (const [spelling, answer] of said) if (answer !== 'own') move(grouped, spelling, answer, counts);
}

function move({ of, groups }: Grouped, spelling: string, answer: string, counts: ReadonlyMap<string, number>): void {
  const from = of.get(spelling);
  if (typeof from !== 'object' || (answer === 'own' && from.spellings.length === 1)) return;
  const count = counts.get(spelling) ?? 0;
  const own = { ...from, id: `own|${fold(spelling)}`, name: spelling, count: 0, spellings: [], isSplit: true };
  const to = answer === 'own' ? own : answer === 'aside' ? 'aside' : groups.find(({ id }) => id === answer);
  if (to === undefined || to === from) return;
  leave(from, spelling, counts);
  if (from.spellings.length === 0) groups.splice(groups.indexOf(from), 1);
  if (to === own) groups.push(own);
  of.set(spelling, to);
  if (to === 'aside') return;
  to.spellings.push(spelling);
  to.count += count;
}

function leave(from: VehicleGroup, spelling: string, counts: ReadonlyMap<string, number>): void {
  from.spellings.splice(from.spellings.indexOf(spelling), 1);
  from.count -= counts.get(spelling) ?? 0;
  const [first] = from.spellings;
  if (from.name !== spelling || first === undefined) return;
  const often = (one: string) => counts.get(one) ?? 0;
  from.name = from.spellings.reduce((best, one) => (often(one) > often(best) ? one : best), first);
}

/** The spellings that name another color than the one that most of their group name. */
function otherColors({ spellings }: VehicleGroup, counts: ReadonlyMap<string, number>): string[] {
  const named = spellings.flatMap((spelling) => {
    const color = spelling
      .split(/[\s,;/]+/)
      .map(colorOf)
      .find((one) => one !== null);
    return color ? [{ spelling, color, count: counts.get(spelling) ?? 0 }] : [];
  });
  const [main] = [...named].sort((a, b) => b.count - a.count);
  return named.filter(({ color }) => color !== main?.color).map(({ spelling }) => spelling);
}
