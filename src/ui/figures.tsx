import type { ReactNode } from 'react';
import type { CentsShown } from '#shared/format.ts';
import { useFormatter } from './formatter-context.tsx';

/** Nothing there: a dash for the eye, words for the ear. `why` ("too few yet") is shown in place of the dash. */
export function Nothing({ why }: { why?: string }) {
  if (why) return <span className="text-soft">{why}</span>;
  return (
    <span className="text-soft">
      <span aria-hidden="true">–</span>
      <span className="sr-only">nothing recorded</span>
    </span>
  );
}

type Tone = 'plain' | 'kept' | 'cost';

/** Steel for a good outcome, oxide for a bad one. kept: above zero is good. cost: above zero (over plan) is bad. */
function toned(value: number, tone: Tone, children: ReactNode) {
  if (tone === 'plain' || value === 0) return <span className="tabular-nums">{children}</span>;
  const isGood = tone === 'kept' ? value > 0 : value < 0;
  return <span className={`font-[640] tabular-nums ${isGood ? 'text-steel' : 'text-oxide'}`}>{children}</span>;
}

type Common = {
  /** kept: profit-like; cost: over plan is bad; plain (default): ink. */
  tone?: Tone;
  /** Always a sign: it is a difference. */
  signed?: boolean;
  /** Words in place of a dash when the value is null. */
  why?: string;
};

/** Cents as money. `cents` (null = nothing), `tone`, `signed`, `shown` (auto, always, never), `why`. */
export function Money({
  cents,
  tone = 'plain',
  signed,
  shown = 'auto',
  why,
}: Common & { cents: number | null; shown?: CentsShown }) {
  const format = useFormatter();
  if (cents === null) return <Nothing {...(why ? { why } : {})} />;
  return toned(cents, tone, signed ? format.signed(cents, shown) : format.money(cents, shown));
}

/** Cents by the hour. `cents`, `tone`, `why`. */
export function PerHour({ cents, tone = 'plain', why }: Common & { cents: number | null }) {
  const format = useFormatter();
  if (cents === null) return <Nothing {...(why ? { why } : {})} />;
  return toned(cents, tone, format.perHour(cents));
}

/** A fraction as a percentage. `rate`, `digits` (0), `tone`, `signed`, `why`. */
export function Percent({
  rate,
  digits = 0,
  tone = 'plain',
  signed,
  why,
}: Common & { rate: number | null; digits?: number }) {
  const format = useFormatter();
  if (rate === null) return <Nothing {...(why ? { why } : {})} />;
  return toned(rate, tone, signed ? format.signedPercent(rate, digits) : format.percent(rate, digits));
}

/** A number of days, `unit` writes the word. `days`, `why`. */
export function Days({ days, unit = false, why }: { days: number | null; unit?: boolean; why?: string }) {
  const format = useFormatter();
  if (days === null) return <Nothing {...(why ? { why } : {})} />;
  return <span className="tabular-nums">{unit ? format.days(days) : format.number(days)}</span>;
}

/** Seconds as decimal hours. `seconds`, `exact` (two decimals kept), `why`. */
export function Hours({ seconds, exact = false, why }: { seconds: number | null; exact?: boolean; why?: string }) {
  const format = useFormatter();
  if (seconds === null) return <Nothing {...(why ? { why } : {})} />;
  return <span className="tabular-nums">{format.hours(seconds, exact)}</span>;
}
