import type { NetFlows } from '../domain/net-flows.ts';
import type { RawDatabase } from '../platform/database.ts';

/** Cash flows as they are kept: net cents per day number, packed as pairs of little-endian doubles. */

/** Packs net flows; days without a net flow are left out. */
export function packFlows(net: ReadonlyMap<number, number>): Buffer {
  const flows = [...net].filter(([, cents]) => cents !== 0);
  const packed = Buffer.allocUnsafe(flows.length * 16);
  flows.forEach(([day, cents], i) => {
    packed.writeDoubleLE(day, i * 16);
    packed.writeDoubleLE(cents, i * 16 + 8);
  });
  return packed;
}

/** Adds packed flows to a sum of flows per day. */
export function addPackedFlows(sum: Map<number, number>, packed: Buffer): void {
  for (let i = 0; i < packed.length; i += 16) {
    const day = packed.readDoubleLE(i);
    sum.set(day, (sum.get(day) ?? 0) + packed.readDoubleLE(i + 8));
  }
}

const FLOWS = `
  SELECT flows FROM rollup_rebuilds
  WHERE shop_id = ? AND rebuild_id IN (SELECT value FROM json_each(?)) AND flows IS NOT NULL`;

/** Flows of these rebuilds together, by day; one that has no annual return has none. */
export function pooledFlows(raw: RawDatabase, shopId: string, rebuildIds: readonly string[]): NetFlows {
  const net = new Map<number, number>();
  const packed = raw.prepare(FLOWS).pluck().all(shopId, JSON.stringify(rebuildIds)) as Buffer[];
  for (const flows of packed) addPackedFlows(net, flows);
  return net;
}
