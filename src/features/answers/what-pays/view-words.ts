import type { PayView } from '#shared/vocabulary.ts';

/** How each view is named where it is chosen, above its grid, over its column, and after a value in the grid. */
export const VIEW_WORDS: Record<PayView, { label: string; title: string; header: string; unit: string; each: string }> =
  {
    'per-hour': {
      label: 'Own hours',
      title: 'Kept for each own hour, by class and damage',
      header: 'Kept an hour, pulled',
      unit: '/h',
      each: 'what it kept ÷ own hours',
    },
    'all-hours': {
      label: 'All hours',
      title: 'Brought by each hour, own and paid, by class and damage',
      header: 'Brought an hour, pulled',
      unit: '/h',
      each: 'what it kept and the wages paid on it ÷ all hours, own and paid',
    },
    'after-wage': {
      label: 'After own wage',
      title: 'Left of a rebuild after a wage for own hours, by class and damage',
      header: 'Left a rebuild, pulled',
      unit: '',
      each: 'what it kept − own hours × the wanted pay per hour',
    },
    'on-cost': {
      label: 'On cost',
      title: 'Kept for each dollar of cost, by class and damage',
      header: 'On cost, pulled',
      unit: '',
      each: 'what it kept ÷ all-in cost',
    },
  };
