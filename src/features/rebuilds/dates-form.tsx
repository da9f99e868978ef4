import { useWatch } from 'react-hook-form';
import type { RebuildDetail } from '#shared/contracts/rebuilds.ts';
import { daysBetween, isDay } from '#shared/day.ts';
import { REBUILD_DATES } from '#shared/vocabulary.ts';
import { Caution } from '../../ui/answer-header.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { DayField } from '../../ui/text-field.tsx';
import { datesSchema, formOf } from './rebuild-form.ts';
import { SectionForm } from './section-form.tsx';
import type { SaveRebuild } from './use-save-rebuild.tsx';
import { useSectionForm } from './use-section-form.ts';

type Props = { detail: RebuildDetail; canWrite: boolean; save: SaveRebuild };

/** The ten marking dates in their order, with the days between them. Odd orders are pointed out and kept. */
export function DatesForm({ detail, canWrite, save }: Props) {
  const { decimal } = useFormatter();
  const { form, frame } = useSectionForm(formOf(detail.rebuild, decimal).dates, datesSchema, save);
  const { register, control, formState } = form;
  const days = useWatch({ control });
  const marked = detail.cautions.filter(
    (caution) => caution.asked && formState.dirtyFields[caution.asked] && days[caution.asked],
  );
  return (
    <SectionForm {...frame} canWrite={canWrite}>
      <ol className="timeline">
        {REBUILD_DATES.map(([field, word], at) => (
          <li key={field} className={days[field] ? 'timeline-stop' : 'timeline-stop timeline-open'}>
            <DayField
              label={word}
              {...register(field)}
              error={formState.errors[field]?.message}
              hint={warningOf(detail, field) ?? sinceLast(days, at)}
            />
          </li>
        ))}
      </ol>
      {marked.map((caution) => (
        <Caution key={caution.about}>{caution.text}</Caution>
      ))}
      <StageDays detail={detail} />
    </SectionForm>
  );
}

function warningOf(detail: RebuildDetail, field: string) {
  const warning = detail.warnings.find((one) => one.pointer === `/${field}`);
  return warning && <span className="font-semibold text-oxide">{warning.detail}</span>;
}

/** Days since the nearest earlier date that is known. */
function sinceLast(days: Partial<Record<string, string>>, at: number): string | undefined {
  const here = days[REBUILD_DATES[at]?.[0] ?? ''];
  const before = REBUILD_DATES.slice(0, at).findLast(([field]) => days[field]);
  const last = before && days[before[0]];
  if (!here || !last || !isDay(here) || !isDay(last)) return undefined;
  const between = daysBetween(last, here);
  return between === 0 ? 'same day' : `${between > 0 ? '+' : '−'}${Math.abs(between)} days`;
}

function StageDays({ detail }: { detail: RebuildDetail }) {
  const format = useFormatter();
  const known = detail.stageDays.filter((stage) => stage.days !== null);
  if (known.length === 0) return null;
  return (
    <p className="text-soft">{known.map((stage) => `${stage.name} ${format.days(stage.days ?? 0)}`).join(' · ')}</p>
  );
}
