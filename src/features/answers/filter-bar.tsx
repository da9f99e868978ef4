import { capital } from '../../lib/capital.ts';
import { Popover } from '@base-ui/react/popover';
import type { FilterOptions, FilterQuery } from '#shared/contracts/answers-parts.ts';
import { Button } from '../../ui/button.tsx';
import { ChipChoice } from '../../ui/segmented.tsx';
import { SelectField } from '../../ui/text-field.tsx';
import { type FilterName, useAddress } from './address.ts';
import { filterWords, isFiltered } from './filter-words.ts';

/** The filters of an answer, kept in the address: a button that says what is shown and opens the choices of this shop. */
export function FilterBar({ options }: { options: FilterOptions }) {
  const { filter, change } = useAddress();
  const clear = () => change({ from: null, to: null, class: null, damage: null, seen: null });
  return (
    <>
      {isFiltered(filter) && (
        <Button kind="plain" size="small" onClick={clear}>
          Show all
        </Button>
      )}
      <Popover.Root>
        <Popover.Trigger className="button button-small max-w-[min(30rem,80vw)] text-left">
          <span className="sr-only">Filter: </span>
          {filterWords(filter, options)} <span aria-hidden="true">▾</span>
        </Popover.Trigger>
        <Popover.Portal>
          <Popover.Positioner sideOffset={4} align="end" className="z-40">
            <Popover.Popup className="popup max-h-[min(34rem,var(--available-height))] w-[min(22rem,calc(100vw-2rem))] p-4">
              <Popover.Title className="mb-3 font-[660]">Which rebuilds</Popover.Title>
              <Choices options={options} filter={filter} change={change} />
            </Popover.Popup>
          </Popover.Positioner>
        </Popover.Portal>
      </Popover.Root>
    </>
  );
}

function Choices(props: {
  options: FilterOptions;
  filter: FilterQuery;
  change: (values: Partial<Record<FilterName, string | null>>) => void;
}) {
  const { options, filter, change } = props;
  const years = options.years.map(({ year, count }) => ({ value: `${year}`, label: `${year} (${count})` }));
  const named = (list: readonly { id: string; name: string; count: number }[]) => [
    ...list
      .filter((one) => one.count > 0)
      .map((one) => ({ value: one.id, label: `${capital(one.name)} (${one.count})` })),
    { value: 'unknown', label: 'not known' },
  ];
  const verb = options.yearOf === 'listed' ? 'Listed' : 'Left';
  return (
    <div className="grid gap-3">
      <div className="grid grid-cols-2 gap-3">
        <SelectField
          label={`${verb} from`}
          none="any year"
          options={years}
          value={filter.from ?? ''}
          onChange={(event) => change({ from: event.target.value })}
        />
        <SelectField
          label={`${verb} up to`}
          none="any year"
          options={years}
          value={filter.to ?? ''}
          onChange={(event) => change({ to: event.target.value })}
        />
      </div>
      <SelectField
        label="Class"
        none="all classes"
        options={named(options.classes)}
        value={filter.class ?? ''}
        onChange={(event) => change({ class: event.target.value })}
      />
      <SelectField
        label="Damage"
        none="all damage"
        options={named(options.damages)}
        value={filter.damage ?? ''}
        onChange={(event) => change({ damage: event.target.value })}
      />
      <ChipChoice
        label="Seen before buying"
        options={[
          { value: '', label: 'all' },
          { value: 'yes', label: `seen (${options.seen.yes})` },
          { value: 'no', label: `unseen (${options.seen.no})` },
          ...(options.seen.unknown > 0 ? [{ value: 'unknown', label: `not said (${options.seen.unknown})` }] : []),
        ]}
        value={filter.seen ?? ''}
        onChange={(value) => change({ seen: value })}
      />
    </div>
  );
}
