import { useMemo } from 'react';
import type { Choice, Reading, RebuildFound } from '#shared/contracts/import-reading.ts';
import { DataTable } from '../../../ui/data-table.tsx';
import { Money } from '../../../ui/figures.tsx';
import { Panel } from '../../../ui/panel.tsx';
import type { Column } from '../../../ui/table.tsx';
import { SelectField } from '../../../ui/text-field.tsx';
import type { Place } from '../place.ts';
import type { Settings } from '../use-settings.ts';

type Props = { reading: Reading; settings: Settings; canChange: boolean; onJump: (place: Place) => void };

/** The rebuilds that the file is about, each with every way that it is written there; what may be another vehicle can be said so here. */
export function RebuildsFound({ reading, settings, canChange, onJump }: Props) {
  const rows = useMemo(() => reading.rebuilds, [reading]);
  const columns = useMemo((): Column<RebuildFound>[] => {
    const money = { number: true, width: 'w-32', under: 'phone' } as const;
    return [
      {
        id: 'tag',
        header: 'Rebuild',
        heads: true,
        width: 'w-40',
        sortBy: (found) => found.tag,
        cell: ({ tag, sheet, row }) =>
          row > 0 ? (
            <button type="button" className="place-link text-left" onClick={() => onJump({ sheet, row, col: null })}>
              {tag}
            </button>
          ) : (
            tag
          ),
      },
      {
        id: 'name',
        header: 'Vehicle',
        width: 'w-48 min-w-36',
        under: 'phone',
        cell: (found) => [found.year, found.make, found.model].filter(Boolean).join(' '),
      },
      {
        id: 'spellings',
        header: 'In the file as',
        width: 'w-80 min-w-60',
        cell: (found) => <Spellings {...{ found, reading, settings, canChange }} />,
      },
      {
        id: 'is',
        header: 'In your books',
        width: 'w-36',
        cell: (found) => (found.existingId ? 'joins this rebuild' : 'new'),
      },
      {
        id: 'paid',
        header: 'Bought for',
        ...money,
        sortBy: (found) => found.purchaseCents,
        cell: (found) => <Money cents={found.purchaseCents} shown="always" />,
      },
      {
        id: 'sold',
        header: 'Sold for',
        ...money,
        sortBy: (found) => found.saleCents,
        cell: (found) => <Money cents={found.saleCents} shown="always" />,
      },
    ];
  }, [reading, settings, canChange, onJump]);
  if (rows.length === 0) return null;
  return (
    <Panel
      title={`Rebuilds in this file: ${rows.length}`}
      subtitle="Spellings that mean the same vehicle are one. Where one may be another vehicle, say so here; a single row is put right in the file above."
    >
      <DataTable caption="Rebuilds in this file" rows={rows} columns={columns} rowKey={(found) => found.tag} />
    </Panel>
  );
}

type SpellingProps = { found: RebuildFound } & Omit<Props, 'onJump'>;

/** Every spelling of a vehicle; one that was taken for it with a doubt can be taken for another. */
function Spellings({ found, reading, settings, canChange }: SpellingProps) {
  const doubts = reading.choices.filter((choice) => choice.kind === 'vehicle' && isAbout(choice, found));
  const asked = new Set(doubts.map(({ id }) => id));
  const others = reading.rebuilds.flatMap(({ tag, vehicleId }) =>
    vehicleId ? [{ value: vehicleId, label: tag }] : [],
  );
  const free = found.vehicleId === null || found.spellings.length === 1 ? [] : found.spellings;
  return (
    <div className="grid gap-2">
      <span className="text-soft">{found.spellings.join(' · ')}</span>
      {canChange &&
        doubts.map((choice) => (
          <SelectField
            key={choice.id}
            label={choice.question}
            options={choice.options}
            {...(choice.mustAsk ? { none: 'Choose' } : {})}
            value={settings.answerOf(choice.id) ?? choice.answer ?? (choice.mustAsk ? '' : choice.preset)}
            onChange={(event) => event.target.value && settings.setAnswer(choice.id, event.target.value)}
          />
        ))}
      {canChange &&
        free
          .filter((spelling) => !asked.has(`vehicle:${spelling}`))
          .map((spelling) => (
            <SelectField
              key={spelling}
              label={`“${spelling}” is`}
              options={[...others, ...ELSEWHERE]}
              value={settings.answerOf(`vehicle:${spelling}`) ?? found.vehicleId ?? ''}
              onChange={(event) => settings.setAnswer(`vehicle:${spelling}`, event.target.value)}
            />
          ))}
    </div>
  );
}

const ELSEWHERE = [
  { value: 'own', label: 'a vehicle of its own' },
  { value: 'aside', label: 'none: put its rows aside' },
];

/** A question about a vehicle ends its id with the spelling that is in doubt. */
const isAbout = (choice: Choice, { spellings }: RebuildFound) =>
  spellings.some((spelling) => choice.id === `vehicle:${spelling}` || choice.id === `rebuild:${spelling}`);
