import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import type { Shop } from '#shared/contracts/shop.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { applyProblem } from '../../lib/apply-problem.ts';
import { useUnsaved } from '../../lib/unsaved.ts';
import { notify } from '../../ui/toast.tsx';
import { type ShopChange, useShopEdit } from './mutations.ts';
import { changesOf, type ShopFields, type ShopTyped, shopFormSchema, shopTyped, undoOf } from './shop-form.ts';

/** The shop's form: sends what was changed, over the version that it was opened with. */
export function useShopForm(shop: Shop) {
  const [base, setBase] = useState(shop);
  const form = useForm<ShopTyped, unknown, ShopFields>({
    resolver: zodResolver(shopFormSchema(base.locale)),
    values: shopTyped(base),
  });
  const { edit, conflict, dismiss } = useShopEdit();
  const startFrom = (saved: Shop) => {
    setBase(saved);
    form.reset(shopTyped(saved));
  };
  useUnsaved(form.formState.isDirty);
  // A newer shop shows at once, but never over something half typed: then its version will tell at the save.
  if (!form.formState.isDirty && base.version < shop.version) setBase(shop);

  const put = async (before: Shop, change: ShopChange, said: string): Promise<void> => {
    const after = await edit(before, change);
    if (!after) return;
    startFrom(after);
    const back = undoOf(change, before);
    notify(said, { undo: () => void put(after, back, 'As before').catch(onRefused) });
  };
  const onRefused = (refused: unknown) => {
    if (!(refused instanceof ApiProblem)) throw refused;
    notify(refused.message, { wrong: true });
  };
  const onSubmit = form.handleSubmit(async (fields) => {
    const change = changesOf(fields, base);
    if (Object.keys(change).length === 0) return startFrom(base);
    await put(base, change, 'Shop saved').catch((refused: unknown) => applyProblem(form, refused));
  });
  const choose = {
    mine: () => void (conflict && put(conflict.theirs, conflict.mine, 'Shop saved').catch(onRefused)),
    theirs: () => {
      if (conflict) startFrom(conflict.theirs);
      dismiss();
    },
  };
  return { form, onSubmit, conflict, choose };
}
