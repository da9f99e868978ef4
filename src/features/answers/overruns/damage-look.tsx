import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import { capital } from '../../../lib/capital.ts';
import { Percent } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { SelectField } from '../../../ui/text-field.tsx';
import { useAddress } from '../address.ts';
import { differenceWords, points } from '../sentences/judged.ts';
import { lookOrDamage } from '../sentences/overruns.ts';

type Damage = OverrunsAnswer['damages'][number];
type Looked = Damage['own']['seen'];
type Row = { name: string; seen: Looked; unseen: Looked; gap: Damage['look'] };

/** Is it the damage, or the bid without a look? One damage against all others, both split by seen. */
export function DamageLook({ damages }: { damages: OverrunsAnswer['damages'] }) {
  const format = useFormatter();
  const { search, change } = useAddress();
  const asked = damages.find(({ damageId }) => damageId === search.get('split'));
  const one = asked ?? damages[0];
  if (!one || damages.length < 2) return null;
  const rows: Row[] = [
    { name: `${capital(one.name)} damage`, ...one.own, gap: one.look },
    { name: 'All other damage', ...one.others, gap: one.lookOthers },
  ];
  const inPoints = (rate: number) => points(rate, format);
  return (
    <Panel
      className="mb-6"
      title="Is it the damage, or the bid without a look?"
      subtitle={lookOrDamage(one, format)}
      actions={
        <SelectField
          label="Damage to split"
          hideLabel
          className="w-auto"
          value={one.damageId}
          onChange={(event) =>
            change({ split: event.target.value === damages[0]?.damageId ? null : event.target.value })
          }
          options={damages.map(({ damageId, name }) => ({ value: damageId, label: `${capital(name)} damage` }))}
        />
      }
    >
      <Table caption="Damage split by seen" rows={rows} columns={COLUMNS} rowKey={(row) => row.name} />
      <p className="mt-3 tabular-nums">
        Unseen less seen: {one.name} damage {differenceWords(one.look, inPoints)}; all other{' '}
        {differenceWords(one.lookOthers, inPoints)}. {capital(one.name)} damage less all other: seen{' '}
        {differenceWords(one.damageSeen, inPoints)}; unseen {differenceWords(one.damageUnseen, inPoints)}.
      </p>
    </Panel>
  );
}

const overrun = (one: Looked) => (
  <>
    <Percent rate={one.pooled} signed tone="cost" />
    <span className="block text-label text-soft">
      {one.n} {one.isThin && one.n > 0 && '· too few yet'}
    </span>
  </>
);

const surprised = ({ surprises }: Looked) =>
  surprises.n > 0 && (
    <>
      <Percent rate={surprises.rate} />
      <span className="block text-label text-soft">
        {surprises.x} of {surprises.n}
      </span>
    </>
  );

const COLUMNS: readonly Column<Row>[] = [
  { id: 'name', header: 'Kind', heads: true, cell: (row) => row.name },
  { id: 'seen', header: 'Overrun, seen', number: true, cell: (row) => overrun(row.seen) },
  { id: 'unseen', header: 'Overrun, unseen', number: true, cell: (row) => overrun(row.unseen) },
  { id: 'seen-surprise', header: 'Surprise, seen', under: 'phone', number: true, cell: (row) => surprised(row.seen) },
  {
    id: 'unseen-surprise',
    header: 'Surprise, unseen',
    under: 'phone',
    number: true,
    cell: (row) => surprised(row.unseen),
  },
];
