import { z } from 'zod';
import { type Shop, shopFieldsSchema } from '#shared/contracts/shop.ts';
import { decimalMark } from '#shared/format.ts';
import { into } from '../../lib/form-text.ts';
import { centsToText, optionalCentsTextSchema } from '../../lib/money-text.ts';
import type { ShopChange } from './mutations.ts';

export type ShopTyped = z.input<ReturnType<typeof shopFormSchema>>;
export type ShopFields = z.output<typeof shopFieldsSchema>;

/** What the form holds, all as text in the way of the shop's locale, turned into what the contract takes. */
export function shopFormSchema(locale: string) {
  return z
    .strictObject({
      name: z.string(),
      currency: z.string(),
      locale: z.string(),
      timeZone: z.string(),
      yearStartMonth: z.string().transform(Number),
      wantedCentsPerHour: optionalCentsTextSchema(decimalMark(locale)),
    })
    .transform(into(shopFieldsSchema));
}

/** A shop as the form starts with it. */
export function shopTyped(shop: Shop): ShopTyped {
  const { name, currency, locale, timeZone } = shop;
  return {
    name,
    currency,
    locale,
    timeZone,
    yearStartMonth: String(shop.yearStartMonth),
    wantedCentsPerHour: centsToText(shop.wantedCentsPerHour, decimalMark(shop.locale)),
  };
}

/** Those of the fields that differ from the shop: nothing else is sent. */
export function changesOf(fields: ShopFields, shop: Shop): ShopChange {
  const changed = Object.entries(fields).filter(([name, value]) => shop[name as keyof ShopFields] !== value);
  return Object.fromEntries(changed);
}

/** What the shop held before in the fields of a change: the change that undoes it. */
export function undoOf(change: ShopChange, shop: Shop): ShopChange {
  return Object.fromEntries(Object.keys(change).map((name) => [name, shop[name as keyof ShopFields]]));
}
