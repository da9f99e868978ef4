import { createContext, use } from 'react';
import { createFormatter, type Formatter } from '#shared/formatter.ts';

/** The shop's way of writing numbers, for everything below it. The frame provides it. */
export const FormatterContext = createContext<Formatter>(createFormatter({ currency: 'USD', locale: 'en-US' }));

/** The formatter of the shop shown: `money`, `signed`, `percent`, `hours`, `count`, `day` and the rest. */
export function useFormatter(): Formatter {
  return use(FormatterContext);
}
