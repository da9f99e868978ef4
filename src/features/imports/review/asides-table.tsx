import { useMemo } from 'react';
import type { Aside, Reading } from '#shared/contracts/import-reading.ts';
import { DataTable } from '../../../ui/data-table.tsx';
import { Money } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import type { Column } from '../../../ui/table.tsx';
import { columnName, type Place, rowPlace } from '../place.ts';
import type { Settings } from '../use-settings.ts';
import { ASIDE_WORDS } from '../words.ts';
import { CellField } from './cell-field.tsx';

type Props = { reading: Reading; settings: Settings; canChange: boolean; onJump: (place: Place) => void };

/** Every row and cell that does not come in, with its reason and its text, so that nothing is lost in silence; each can be put right here. */
export function AsidesTable({ reading, settings, canChange, onJump }: Props) {
  const format = useFormatter();
  const { asides, asideCount } = reading;
  const columns = useMemo((): Column<Aside>[] => {
    const found: Column<Aside>[] = [
      {
        id: 'row',
        header: 'Row',
        heads: true,
        sortBy: (one) => one.row,
        width: 'w-20',
        cell: (one) => (
          <button type="button" className="place-link" title="Show it in the file" onClick={() => onJump(one)}>
            {rowPlace(reading, one)}
          </button>
        ),
      },
      {
        id: 'reason',
        header: 'Why',
        sortBy: (one) => one.reason,
        width: 'w-52 min-w-36',
        cell: (one) => ASIDE_WORDS[one.reason],
      },
      {
        id: 'column',
        header: 'Column',
        width: 'w-32',
        under: 'phone',
        cell: (one) => (one.col === null ? 'whole row' : columnName(reading, { sheet: one.sheet, col: one.col })),
      },
      {
        id: 'text',
        header: canChange ? 'What stands there; put it right' : 'What stands there',
        width: 'w-72 min-w-44',
        cell: (one) => <AsideText {...{ one, reading, settings, canChange, onJump }} />,
      },
      {
        id: 'cents',
        header: 'Readable money',
        number: true,
        width: 'w-32',
        under: 'phone',
        sortBy: (one) => one.cents,
        cell: (one) => <Money cents={one.cents} shown="always" />,
      },
      {
        id: 'rest',
        header: 'Rest of its row',
        width: 'w-36',
        under: 'phone',
        cell: (one) => (one.isCell ? 'comes in' : 'put aside'),
      },
    ];
    if (canChange)
      found.push({
        id: 'act',
        header: <span className="sr-only">Leave out</span>,
        width: 'w-24',
        under: 'phone',
        bare: true,
        cell: (one) => <LeaveOut one={one} settings={settings} place={rowPlace(reading, one)} />,
      });
    return found;
  }, [reading, settings, canChange, onJump]);
  if (asideCount === 0) return null;
  const isCut = asideCount > asides.length;
  return (
    <Panel
      title={`Put aside: ${format.number(asideCount)}`}
      subtitle={`Not booked, and kept with the file. ${canChange ? 'Type the right text into a cell, or leave the row out; then read the file again.' : 'Enter them by hand where they matter.'}${isCut ? ` The first ${asides.length} are shown.` : ''}`}
    >
      <DataTable
        caption="Rows and cells put aside"
        rows={asides}
        columns={columns}
        rowKey={(one) => `${one.sheet}-${one.row}-${one.col}-${one.reason}`}
      />
    </Panel>
  );
}

function AsideText({ one, reading, settings, canChange, onJump }: Props & { one: Aside }) {
  const { sheet, row, col } = one;
  const isMendable = col !== null && one.cols.includes(col);
  if (settings.isLeftOut(one)) return <span className="text-soft line-through">{one.text || 'nothing'}</span>;
  if (!canChange) return one.text || <span className="text-soft">nothing</span>;
  if (isMendable) {
    const at = { sheet, row, col };
    const label = `${columnName(reading, at)} in row ${rowPlace(reading, one)}`;
    return <CellField hideLabel {...{ at, label, settings }} raw={one.text} />;
  }
  return (
    <span className="flex flex-wrap items-baseline gap-x-3">
      <span className="line-clamp-2">{one.text || <span className="text-soft">nothing</span>}</span>
      {one.cols.length > 0 && (
        <button type="button" className="row-act" onClick={() => onJump(one)}>
          Put it right in the row
        </button>
      )}
    </span>
  );
}

function LeaveOut({ one, settings, place }: { one: Aside; settings: Settings; place: string }) {
  const isOut = settings.isLeftOut(one);
  return (
    <button
      type="button"
      className="row-act"
      aria-label={isOut ? `Keep row ${place}` : `Leave out row ${place}`}
      onClick={() => settings.setLeftOut(one, !isOut)}
    >
      {isOut ? 'Keep it' : 'Leave out'}
    </button>
  );
}
