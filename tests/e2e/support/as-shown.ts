const style = { style: 'currency', currency: 'USD' } as const;

/** Cents to the cent: `$3,214.29`, as lists show them. */
export const toTheCent = (cents: number) => minus(new Intl.NumberFormat('en-US', style).format(cents / 100));

/** Cents as the answers show them: whole dollars from a hundred up, cents below. */
export function dollars(cents: number): string {
  if (Math.abs(cents) < 10_000) return toTheCent(cents);
  return minus(new Intl.NumberFormat('en-US', { ...style, maximumFractionDigits: 0 }).format(cents / 100));
}

/** A fraction as whole percent: `180%`. */
export const percent = (rate: number) => minus(`${Math.round(rate * 100)}%`);

const minus = (text: string) => text.replace('-', '−');
