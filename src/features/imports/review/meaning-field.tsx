import { type Column, MEANINGS, type Meaning } from '#shared/contracts/import-reading.ts';
import { SelectField } from '../../../ui/text-field.tsx';
import type { Settings } from '../use-settings.ts';
import { MEANING_WORDS } from '../words.ts';

const OPTIONS = (Object.keys(MEANING_WORDS) as Meaning[])
  .filter((meaning) => MEANINGS.includes(meaning))
  .map((value) => ({ value, label: MEANING_WORDS[value] }));
const WITH_CATEGORY: readonly Meaning[] = ['cost', 'estimate'];

type Props = { column: Column; settings: Settings; categories: readonly string[] };

/** What a column is taken for, to be corrected; a column of costs, or of planned ones, says of which kind. */
export function MeaningField({ column, settings, categories }: Props) {
  const chosen = settings.columnOf(column) ?? column;
  const name = column.heading || `column ${column.col}`;
  const set = (meaning: Meaning, category: string | null) =>
    settings.setColumn({ sheet: column.sheet, col: column.col, meaning, category });
  return (
    <div className="grid gap-2">
      <SelectField
        hideLabel
        label={`What ${name} holds`}
        options={OPTIONS}
        value={chosen.meaning}
        onChange={(event) => {
          const meaning = event.target.value as Meaning;
          set(meaning, WITH_CATEGORY.includes(meaning) ? (chosen.category ?? categories[0] ?? null) : null);
        }}
      />
      {WITH_CATEGORY.includes(chosen.meaning) && (
        <SelectField
          hideLabel
          label={`Kind of cost in ${name}`}
          options={categories.map((value) => ({ value, label: value }))}
          value={chosen.category ?? ''}
          onChange={(event) => set(chosen.meaning, event.target.value)}
        />
      )}
    </div>
  );
}
