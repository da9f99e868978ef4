import type { z } from 'zod';
import type { gapSchema } from '#shared/contracts/answers-parts.ts';
import type { RebuildFacts } from '../../domain/facts.ts';
import { rebuildOverrun } from '../../domain/overrun.ts';

/** A rebuild's gap bar. An estimate that was written over with the outcome counts as none. */
export function gapOf(rebuild: RebuildFacts): z.input<typeof gapSchema> {
  const overrun = rebuildOverrun(rebuild);
  return {
    lockedCents: overrun === null ? null : rebuild.estimateCents,
    actualCents: rebuild.planningCents,
    surpriseCents: rebuild.surprisePlanningCents,
    overrun,
  };
}
