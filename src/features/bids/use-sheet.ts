import { zodResolver } from '@hookform/resolvers/zod';
import { useDeferredValue, useMemo } from 'react';
import { type UseFormReturn, useForm, useWatch } from 'react-hook-form';
import type { BidFields } from '#shared/contracts/bids.ts';
import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import type { BidFigures } from '#shared/contracts/bids-parts.ts';
import { bidFigures } from '#shared/measures/bid-sheet.ts';
import type { CarTraits } from '#shared/measures/ladder-rungs.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { readSheet, type SheetForm, sheetFormSchema } from './sheet-form.ts';

export type SheetFormApi = UseFormReturn<SheetForm, unknown, BidFields>;

/** What stands on the sheet now, and what it comes to. */
export interface Reading {
  /** null = a field cannot be read. */
  readonly sheet: BidFields | null;
  /** The bid, at once; null = as above. */
  readonly figures: BidFigures | null;
  /** With the chances, which take a phone a moment longer; null = as above. */
  readonly whole: BidFigures | null;
}

/** The sheet's form, starting from `values`; a fault shows at its field while it is typed. */
export function useSheetForm(values: SheetForm) {
  const { decimal } = useFormatter();
  const schema = useMemo(() => sheetFormSchema(decimal), [decimal]);
  const form: SheetFormApi = useForm<SheetForm, unknown, BidFields>({
    defaultValues: values,
    resolver: zodResolver(schema),
    mode: 'onChange',
  });
  return { form, schema };
}

/** Works the sheet out anew with everything typed; nothing is asked of the server. */
export function useReading(values: SheetForm, schema: ReturnType<typeof sheetFormSchema>, basis: BidBasis): Reading {
  const sheet = useMemo(() => readSheet(values, schema), [values, schema]);
  const figures = useMemo(() => sheet && figuresAlone(sheet, basis), [sheet, basis]);
  const later = useDeferredValue(sheet);
  const whole = useMemo(() => later && bidFigures(later, basis), [later, basis]);
  return { sheet, figures, whole };
}

/** What a sheet comes to, without the chances. */
export function figuresAlone(sheet: BidFields, basis: BidBasis): BidFigures {
  return bidFigures(sheet, { ...basis, past: [] });
}

/** Class, damage and seen as they stand on the form. */
export function useCar({ control }: SheetFormApi): CarTraits {
  const [classId, damageId, isSeen] = useWatch({ control, name: ['classId', 'damageId', 'isSeen'] });
  return { classId: classId || null, damageId: damageId || null, isSeen: isSeen === '' ? null : isSeen === 'yes' };
}
