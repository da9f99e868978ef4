import type { z } from 'zod';
import type { gapSchema } from '#shared/contracts/answers-parts.ts';
import { GapBar } from '../../charts/gap-bar.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';

/** The gap bar of one rebuild, from the reply's figures. */
export function Gap({ gap }: { gap: z.output<typeof gapSchema> }) {
  const format = useFormatter();
  return (
    <GapBar
      lockedCents={gap.lockedCents}
      foreseenCents={gap.actualCents - gap.surpriseCents}
      surpriseCents={gap.surpriseCents}
      overrunRate={gap.overrun}
      format={format}
    />
  );
}
