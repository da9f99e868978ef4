import { scaleLinear } from '@visx/scale';

/** A value axis from values to pixels that includes zero, with round ticks and never more of them than fit. Nothing but zeros: one tick. */
export function valueAxis(values: readonly number[], range: [number, number], perTick: number) {
  const room = Math.max(2, Math.floor(Math.abs(range[1] - range[0]) / perTick));
  const low = Math.min(0, ...values);
  const high = Math.max(0, ...values);
  const scale = scaleLinear<number>({ domain: [low, high === low ? low + 1 : high], range });
  return { scale, ticks: (high === low ? [0] : scale.ticks(room)).map((value) => ({ value, at: scale(value) })) };
}
