import type { YearAnswer } from '#shared/contracts/answers-year.ts';
import { formatDayRange } from '#shared/format-day.ts';
import { SelectField } from '../../../ui/text-field.tsx';
import { useAddress } from '../address.ts';

/** Chooses the shop year; it stands in the address. */
export function YearSwitch({ answer }: { answer: YearAnswer }) {
  const { change } = useAddress();
  const years = answer.years.toSorted((a, b) => b.year - a.year);
  const running = years[0]?.year;
  return (
    <SelectField
      label="Year"
      hideLabel
      className="w-auto"
      value={`${answer.year}`}
      onChange={(event) => change({ year: event.target.value === `${running}` ? null : event.target.value })}
      options={years.map(({ year, from, to }) => {
        const last = year === answer.year ? answer.through : to;
        return { value: `${year}`, label: `${year} · ${formatDayRange(from, last)}` };
      })}
    />
  );
}
