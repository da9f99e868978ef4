import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import type { BidFigures } from '#shared/contracts/bids-parts.ts';
import { FormMoney } from '../../ui/form-fields.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import type { SheetFormApi } from './use-sheet.ts';
import { cutWords } from './words.ts';

type Props = { form: SheetFormApi; basis: BidBasis; figures: BidFigures | null };

/** What it should sell for, and the more careful sale that the bid counts on, with the chance that past sales give it. */
export function SaleFields({ form, basis, figures }: Props) {
  const format = useFormatter();
  const chance = figures?.saleChance;
  const reached =
    chance && chance.n > 0
      ? `Past sales came to this share of what was expected ${format.number(chance.x)} times in ${format.number(chance.n)}.${cutWords(basis, format)}`
      : '';
  return (
    <Panel title="The sale" subtitle="Rebuilt, with its title brand. A careful bid counts on less.">
      <div className="grid grid-cols-2 gap-4">
        <FormMoney control={form.control} name="expectedSaleCents" label="Sale expected" />
        <FormMoney control={form.control} name="countedSaleCents" label="The bid counts on" placeholder="The same" />
      </div>
      {reached && <p className="mt-3 text-label text-soft">{reached}</p>}
    </Panel>
  );
}
