import { useFormatter } from '../../ui/formatter-context.tsx';

/** The two ends of an interval of a rate: `24% to 51%`; nothing where an end is not known. */
export function RangeText({
  low,
  high,
  signed = false,
}: {
  low: number | null;
  high: number | null;
  signed?: boolean;
}) {
  const format = useFormatter();
  if (low === null || high === null) return null;
  const write = signed ? format.signedPercent : format.percent;
  return (
    <span className="whitespace-nowrap tabular-nums">
      {write(low)} to {write(high)}
    </span>
  );
}
