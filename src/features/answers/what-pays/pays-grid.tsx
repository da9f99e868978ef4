import type { WhatPaysAnswer } from '#shared/contracts/answers-what-pays.ts';
import { PAY_VIEWS } from '#shared/vocabulary.ts';
import { GridCells } from '../../../charts/grid-cells.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { ChipChoice } from '../../../ui/segmented.tsx';
import { useAddress } from '../address.ts';
import { useShopPath } from '../rebuild-link.tsx';
import { type Group, payFigure } from '../sentences/what-pays.ts';
import { cellOf, gridOf, groupSearch } from './groups.ts';
import { VIEW_WORDS } from './view-words.ts';

/** Class by damage: what each kind brings, its range and its count; gray where too few yet. A cell opens its rebuilds. */
export function PaysGrid({ answer }: { answer: WhatPaysAnswer }) {
  const format = useFormatter();
  const { change } = useAddress();
  const path = useShopPath();
  const { view } = answer;
  const { classes, damages, cell } = gridOf(answer.fits, answer.filters);
  const href = (group: Group) => path(`rebuilds?${groupSearch(group)}`);
  return (
    <Panel
      className="mb-6"
      title={VIEW_WORDS[view].title}
      subtitle="Bold: pulled toward the shop's average. Under it the 95% interval of the mean."
      actions={
        <ChipChoice
          label="What to compare"
          hideLabel
          options={PAY_VIEWS.map((value) => ({ value, label: VIEW_WORDS[value].label }))}
          value={view}
          onChange={(value) => change({ view: value === 'per-hour' ? null : value })}
        />
      }
    >
      {classes.length === 0 ? (
        <p className="text-soft">No finished rebuild has class, damage and what this view asks for yet.</p>
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
          write={(value) => payFigure(value, view, format)}
          unit={VIEW_WORDS[view].unit}
        />
      )}
    </Panel>
  );
}
