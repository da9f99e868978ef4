import type { Shop } from '#shared/contracts/shop.ts';
import { shopFieldsSchema } from '#shared/contracts/shop.ts';
import { createFormatter } from '#shared/formatter.ts';
import type { ShopChange } from './mutations.ts';

export const MONTHS = Array.from({ length: 12 }, (_, month) =>
  new Intl.DateTimeFormat('en', { month: 'long', timeZone: 'UTC' }).format(Date.UTC(2026, month, 1)),
);

const currencyNames = new Intl.DisplayNames('en', { type: 'currency' });
const languageNames = new Intl.DisplayNames('en', { type: 'language', languageDisplay: 'standard' });

/** Currencies that the books can hold, by code and name. */
export function currencyOptions() {
  return Intl.supportedValuesOf('currency')
    .filter((code) => shopFieldsSchema.shape.currency.safeParse(code).success)
    .map((code) => ({ value: code, label: `${code}, ${currencyNames.of(code) ?? code}` }));
}

/** Time zones as people read them: "America/Los Angeles". */
export function zoneOptions() {
  return ['UTC', ...Intl.supportedValuesOf('timeZone').filter((zone) => zone !== 'UTC')].map((zone) => ({
    value: zone,
    label: zone.replaceAll('_', ' '),
  }));
}

const LOCALES = ['en-US', 'en-CA', 'en-GB', 'en-IE', 'en-AU', 'en-NZ', 'en-ZA', 'fr-CA', 'es-US', 'es-MX'];
const MORE = ['pt-BR', 'de-DE', 'de-CH', 'fr-FR', 'it-IT', 'es-ES', 'nl-NL', 'pl-PL', 'sv-SE', 'cs-CZ'];

/** Ways of writing numbers, each with its look; the shop's own is among them whatever it is. */
export function localeOptions(own: string) {
  return [...new Set([own, ...LOCALES, ...MORE])].map((locale) => ({
    value: locale,
    label: `${languageNames.of(locale) ?? locale}: ${new Intl.NumberFormat(locale, { minimumFractionDigits: 2 }).format(12_345.6)}`,
  }));
}

/** One setting of the shop as text. `shop` says in which currency and locale. */
export function settingInWords(
  name: keyof ShopChange,
  value: unknown,
  shop: Pick<Shop, 'currency' | 'locale'>,
): string {
  if (name === 'yearStartMonth') return MONTHS[Number(value) - 1] ?? String(value);
  if (name === 'wantedCentsPerHour')
    return value === null ? 'not said' : `${createFormatter(shop).money(Number(value))} an hour`;
  if (name === 'currency') return `${String(value)}, ${currencyNames.of(String(value)) ?? ''}`;
  if (name === 'locale') return localeOptions(String(value))[0]?.label ?? String(value);
  return String(value).replaceAll('_', ' ');
}

export const SETTINGS: readonly { name: keyof ShopChange; label: string; says: string }[] = [
  { name: 'name', label: 'Name', says: 'As it stands in the rail and on papers.' },
  {
    name: 'wantedCentsPerHour',
    label: 'Wanted pay per hour',
    says: 'Per hour is counted on unpaid hours: paid labor is in the costs already.',
  },
  {
    name: 'currency',
    label: 'Currency',
    says: 'The sign before amounts. Amounts already in the books stay as they are.',
  },
  {
    name: 'locale',
    label: 'How numbers are written',
    says: 'Also how typed amounts and files are read: which mark parts the cents.',
  },
  { name: 'timeZone', label: 'Time zone', says: 'Says which day it is in the shop.' },
  {
    name: 'yearStartMonth',
    label: 'The year starts in',
    says: 'The year is named by the calendar year in which it begins.',
  },
];
