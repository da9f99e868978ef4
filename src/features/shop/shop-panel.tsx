import { useMemo } from 'react';
import type { Shop } from '#shared/contracts/shop.ts';
import { Button } from '../../ui/button.tsx';
import { ConflictDialog } from '../../ui/conflict.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { FormMoney, FormPick } from '../../ui/form-fields.tsx';
import { Panel } from '../../ui/panel.tsx';
import { SelectField, TextField } from '../../ui/text-field.tsx';
import type { ShopChange } from './mutations.ts';
import { currencyOptions, localeOptions, MONTHS, SETTINGS, settingInWords, zoneOptions } from './shop-words.ts';
import { useShopForm } from './use-shop-form.ts';

const MONTH_OPTIONS = MONTHS.map((label, month) => ({ value: String(month + 1), label }));
const says = Object.fromEntries(SETTINGS.map((setting) => [setting.name, setting]));

/** The shop's name and how it counts, to be changed by an owner. */
export function ShopPanel({ shop }: { shop: Shop }) {
  const { form, onSubmit, conflict, choose } = useShopForm(shop);
  const { errors, isSubmitting, isDirty } = form.formState;
  const currencies = useMemo(() => currencyOptions(), []);
  const zones = useMemo(() => zoneOptions(), []);
  const asked = (name: keyof ShopChange) => ({
    name,
    label: says[name]?.label ?? name,
    ...(says[name] ? { hint: says[name].says } : {}),
  });
  const text = (name: 'name' | 'locale' | 'yearStartMonth') => ({
    ...form.register(name),
    ...asked(name),
    error: errors[name]?.message,
  });
  return (
    <Panel title="The shop and how it counts">
      <form onSubmit={(event) => void onSubmit(event)} noValidate className="grid gap-5">
        <div className="grid gap-x-8 gap-y-5 sm:grid-cols-2">
          <TextField {...text('name')} maxLength={80} autoComplete="organization" />
          <div className="grid content-start gap-1">
            <FormMoney
              control={form.control}
              name="wantedCentsPerHour"
              label={says['wantedCentsPerHour']?.label ?? ''}
            />
            <p className="field-hint">{says['wantedCentsPerHour']?.says}</p>
          </div>
          <FormPick control={form.control} {...asked('currency')} name="currency" options={currencies} />
          <SelectField {...text('locale')} options={localeOptions(shop.locale)} />
          <FormPick control={form.control} {...asked('timeZone')} name="timeZone" options={zones} />
          <SelectField {...text('yearStartMonth')} options={MONTH_OPTIONS} />
        </div>
        <ErrorSummary message={errors.root?.['server']?.message} fields={fieldsWrong(errors)} />
        <div className="flex flex-wrap gap-3">
          <Button kind="main" type="submit" busy={isSubmitting}>
            Save the shop
          </Button>
          {isDirty && <Button onClick={() => form.reset()}>Leave it as it was</Button>}
        </div>
      </form>
      {conflict && (
        <ConflictDialog
          subject="the shop"
          fields={conflictOf(conflict.mine, conflict.theirs)}
          onMine={choose.mine}
          onTheirs={choose.theirs}
        />
      )}
    </Panel>
  );
}

function fieldsWrong(errors: object): number {
  return Object.keys(errors).filter((name) => name !== 'root').length;
}

/** Wanted settings beside those saved meanwhile. */
function conflictOf(mine: ShopChange, theirs: Shop) {
  return SETTINGS.filter(({ name }) => mine[name] !== undefined).map(({ name, label }) => ({
    name: label,
    mine: settingInWords(name, mine[name], { ...theirs, ...mine }),
    theirs: settingInWords(name, theirs[name], theirs),
  }));
}

/** The same to read, for those who keep or read the books. */
export function ShopFacts({ shop }: { shop: Shop }) {
  return (
    <Panel title="The shop and how it counts" subtitle="Only an owner changes this.">
      <dl className="grid gap-x-8 gap-y-4 sm:grid-cols-2">
        {SETTINGS.map(({ name, label, says: words }) => (
          <div key={name}>
            <dt className="field-label">{label}</dt>
            <dd>{settingInWords(name, shop[name], shop)}</dd>
            <dd className="field-hint">{words}</dd>
          </div>
        ))}
      </dl>
    </Panel>
  );
}
