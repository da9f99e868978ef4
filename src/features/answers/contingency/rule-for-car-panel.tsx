import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { FilterOptions } from '#shared/contracts/answers-parts.ts';
import type { RuleForCar } from '#shared/contracts/answers-rule-for-car.ts';
import type { LevelName } from '#shared/vocabulary.ts';
import { capital } from '../../../lib/capital.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { ErrorState, LoadingState } from '../../../ui/states.tsx';
import { SelectField } from '../../../ui/text-field.tsx';
import { sayForCar } from '../sentences/rule-for-car.ts';
import type { Kind } from './kind.ts';
import { ruleForCarQuery } from './queries.ts';
import { RungsTried } from './rungs-tried.tsx';

type Props = { options: FilterOptions; level: LevelName; kind: Kind };
type Car = { class: string; damage: string; seen: '' | 'yes' | 'no' };

/** What cushion does such a car ask for: from the finest group of past rebuilds that carries a rule, named. */
export function RuleForCarPanel({ options, level, kind }: Props) {
  const [car, setCar] = useState<Car>({ class: '', damage: '', seen: '' });
  const set = (change: Partial<Car>) => setCar({ ...car, ...change });
  const asked = Object.fromEntries(Object.entries(car).filter(([, value]) => value !== ''));
  const { data, error, refetch } = useQuery({
    ...ruleForCarQuery({ level, ...asked }),
    placeholderData: keepPreviousData,
  });
  return (
    <Panel
      title="What does such a car ask for?"
      subtitle="From the past rebuilds most like it, as soon as there are nine; over all rebuilds, whatever the page filters."
    >
      <div className="mb-4 grid gap-3 sm:grid-cols-3">
        <SelectField
          label="Class"
          none="any"
          options={named(options.classes)}
          value={car.class}
          onChange={(event) => set({ class: event.target.value })}
        />
        <SelectField
          label="Damage"
          none="any"
          options={named(options.damages)}
          value={car.damage}
          onChange={(event) => set({ damage: event.target.value })}
        />
        <SelectField
          label="Seen before buying"
          none="not said"
          options={SEEN}
          value={car.seen}
          onChange={(event) => set({ seen: event.target.value as Car['seen'] })}
        />
      </div>
      {error ? (
        <ErrorState error={error} onRetry={() => void refetch()} />
      ) : data ? (
        <Found found={data} kind={kind} />
      ) : (
        <LoadingState lines={2} />
      )}
    </Panel>
  );
}

const SEEN = [
  { value: 'yes', label: 'seen' },
  { value: 'no', label: 'unseen' },
];

function named(list: FilterOptions['classes']) {
  return list.map(({ id, name, count }) => ({ value: id, label: `${capital(name)} (${count})` }));
}

function Found({ found, kind }: { found: RuleForCar; kind: Kind }) {
  const format = useFormatter();
  return (
    <>
      <ul className="grid gap-2" aria-live="polite">
        {sayForCar(found, kind, format).map(({ order, basis }) => (
          <li key={order + basis}>
            <strong className="text-lead font-[640]">{order}</strong> <span className="text-soft">{basis}</span>
          </li>
        ))}
      </ul>
      <RungsTried found={found} />
    </>
  );
}
