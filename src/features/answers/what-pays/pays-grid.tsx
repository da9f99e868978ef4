import type { WhatPaysAnswer } from '#shared/contracts/answers-what-pays.ts';
import { GridCells } from '../../../charts/grid-cells.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { Segmented } from '../../../ui/segmented.tsx';
import { useAddress } from '../address.ts';
import { useShopPath } from '../rebuild-link.tsx';
import { fitsOf, type Group, type PayView } from '../sentences/what-pays.ts';
import { cellOf, gridOf, groupSearch } from './groups.ts';

/** Class by damage: what each kind brings, its range and its count; gray where too few yet. A cell opens its rebuilds. */
export function PaysGrid({ answer, view }: { answer: WhatPaysAnswer; view: PayView }) {
  const format = useFormatter();
  const { change } = useAddress();
  const path = useShopPath();
  const fits = fitsOf(answer, view);
  const { classes, damages, cell } = gridOf(fits, answer.filters);
  const href = (group: Group) => path(`rebuilds?${groupSearch(group)}`);
  const isHour = view === 'per-hour';
  return (
    <Panel
      className="mb-6"
      title={
        isHour ? 'Kept for each own hour, by class and damage' : 'Kept for each dollar of cost, by class and damage'
      }
      subtitle="Bold: pulled toward the shop's average. Under it the 95% interval of the mean."
      actions={
        <Segmented
          label="What to compare"
          options={[
            { value: 'per-hour', label: 'Kept per hour' },
            { value: 'on-cost', label: 'Return on cost' },
          ]}
          value={view}
          onChange={(value) => change({ view: value === 'per-hour' ? null : value })}
        />
      }
    >
      {classes.length === 0 ? (
        <p className="text-soft">No finished rebuild has class, damage and hours yet.</p>
      ) : (
        <GridCells
          caption="The darker the blue, the better it pays; rust loses. Gray: fewer than five, too few yet."
          corner="Class by damage"
          columns={damages.map(({ name }) => name)}
          rows={classes.map(({ id, name, margin }) => ({
            label: name,
            cells: damages.map((damage) => cellOf(cell(id, damage.id), href)),
            all: cellOf(margin, href),
          }))}
          columnAll={damages.map(({ margin }) => cellOf(margin, href))}
          allColumnsLabel="All damage"
          allRowsLabel="All classes"
          format={format}
          write={isHour ? undefined : (value) => format.percent(value)}
          unit={isHour ? '/h' : ''}
        />
      )}
    </Panel>
  );
}
