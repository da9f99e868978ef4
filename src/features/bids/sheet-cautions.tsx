import type { BidFields } from '#shared/contracts/bids.ts';
import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import { bidCautions } from '#shared/trade-cautions.ts';

/** Cautions for the work that this car will bring, by its damage, what hides behind that, and what is planned. */
export function SheetCautions({ sheet, basis }: { sheet: BidFields; basis: BidBasis }) {
  const cautions = cautionsOfSheet(sheet, basis);
  if (cautions.length === 0) return null;
  return (
    <ul aria-label="Cautions" className="grid gap-2">
      {cautions.map(({ about, text }) => (
        <li key={about} className="caution-note">
          <p>
            <strong className="font-[680]">{`Caution, ${about}. `}</strong>
            {text}
          </p>
        </li>
      ))}
    </ul>
  );
}

function cautionsOfSheet(sheet: BidFields, basis: BidBasis) {
  const damage = (id: string | null) => basis.damages.filter((one) => one.id === id).map(({ name }) => name);
  const planned = new Set(sheet.lines.map(({ categoryId }) => categoryId));
  return bidCautions({
    damages: [...damage(sheet.damageId), ...damage(sheet.secondDamageId)],
    categories: basis.categories.filter(({ id }) => planned.has(id)).map(({ name }) => name),
  });
}
