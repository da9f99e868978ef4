import {
  CHECK_GRADES,
  CHECK_ITEMS_LISTED,
  type CheckItem,
  type ChecksAnswer,
  type Finding,
} from '#shared/contracts/checks.ts';
import type { Day } from '#shared/day.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import type { RowFault } from './entry-checks.ts';
import { REBUILD_CHECKS } from './rebuild-checks.ts';
import { type NumberedVehicle, numberFaults, sameVehicle } from './vehicle-numbers.ts';

/** Faults among rows, and which answers they bend. */
export interface RowFinding extends Pick<Finding, 'kind' | 'grade' | 'answers'> {
  readonly faults: readonly RowFault[];
}

export interface CheckInput {
  readonly today: Day;
  readonly rebuilds: readonly ShopRebuild[];
  readonly vehicles: readonly NumberedVehicle[];
  readonly rows: readonly RowFinding[];
  /** `kind key` of what somebody said is right. */
  readonly settled: ReadonlySet<string>;
}

const PLAIN = { entryIds: [], importId: null, on: null, cents: null, text: null };
type Bare = Omit<CheckItem, 'isSettled'>;

/** Everything missing or odd, the gravest first: wrong before left out before unsure, then by how much it touches. */
export function findFaults(input: CheckInput): ChecksAnswer {
  const { rebuilds, today } = input;
  const refOf = refs(rebuilds);
  const finding = (head: Pick<Finding, 'kind' | 'grade' | 'answers'>, among: number | null, items: readonly Bare[]) =>
    findingOf(head, among, items, input.settled);
  const ofRebuilds = REBUILD_CHECKS.map(({ isAmong, isFaulty, ...head }) => {
    const among = rebuilds.filter(isAmong);
    const faulty = among.filter(isFaulty);
    return finding(
      { ...head, answers: [...head.answers] },
      among.length,
      faulty.map(({ id }) => ({ ...PLAIN, key: id, rebuild: refOf(id) })),
    );
  });
  const ofRows = input.rows.map(({ faults, ...head }) =>
    finding(
      head,
      null,
      faults.map(({ rebuildId, ...fault }) => ({ ...fault, rebuild: refOf(rebuildId) })),
    ),
  );
  const ofNumbers = [
    finding(
      { kind: 'vehicle number', grade: 'unsure', answers: [] },
      input.vehicles.length,
      numberFaults(input.vehicles).map(({ id, text }) => ({ ...PLAIN, key: id, rebuild: refOf(id), text })),
    ),
    finding(
      { kind: 'vehicle twice', grade: 'wrong', answers: ['year', 'what-pays'] },
      input.vehicles.length,
      sameVehicle(input.vehicles).map(({ id, firstId, vin }) => ({
        ...PLAIN,
        key: id,
        rebuild: refOf(id),
        text: `${vin}, as on ${refOf(firstId)?.tag ?? 'another rebuild'}`,
      })),
    ),
  ];
  return {
    asOf: today,
    rebuildCount: rebuilds.length,
    finishedCount: rebuilds.filter(({ exit }) => exit !== null).length,
    findings: [...ofRows, ...ofRebuilds, ...ofNumbers]
      .filter(({ count, settledCount }) => count + settledCount > 0)
      .sort(graver),
  };
}

function refs(rebuilds: readonly ShopRebuild[]) {
  const byId = new Map(rebuilds.map(({ id, tag, name }) => [id, { id, tag, name }]));
  return (id: string | null) => (id === null ? null : (byId.get(id) ?? null));
}

function findingOf(
  head: Pick<Finding, 'kind' | 'grade' | 'answers'>,
  among: number | null,
  bare: readonly Bare[],
  settled: ReadonlySet<string>,
): Finding {
  const items = bare.map((item) => ({ ...item, isSettled: settled.has(`${head.kind} ${item.key}`) }));
  const open = items.filter(({ isSettled }) => !isSettled);
  const amounts = open.flatMap(({ cents }) => (cents === null ? [] : [Math.abs(cents)]));
  return {
    ...head,
    among,
    count: open.length,
    settledCount: items.length - open.length,
    cents: amounts.length === 0 ? null : amounts.reduce((sum, cents) => sum + cents, 0),
    items: [...open, ...items.filter(({ isSettled }) => isSettled)].slice(0, CHECK_ITEMS_LISTED),
  };
}

/** Open ones before settled ones; then by grade; then money in question; then how many things times how many answers. */
function graver(a: Finding, b: Finding): number {
  const rank = (finding: Finding) => [
    finding.count === 0 ? 1 : 0,
    CHECK_GRADES.indexOf(finding.grade),
    -(finding.cents ?? 0),
    -finding.count * finding.answers.length,
  ];
  const [left, right] = [rank(a), rank(b)];
  const at = left.findIndex((value, i) => value !== right[i]);
  return at < 0 ? 0 : (left[at] ?? 0) - (right[at] ?? 0);
}
