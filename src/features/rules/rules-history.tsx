import { useQuery } from '@tanstack/react-query';
import type { Rule } from '#shared/contracts/rules.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { ErrorState } from '../../ui/states.tsx';
import { type Column, Table } from '../../ui/table.tsx';
import { rulesQuery } from './queries.ts';
import { ruleText } from './rule-words.ts';

/** Every rule adopted, the latest first, with what it rested on that day. */
export function RulesHistory() {
  const { data, error, refetch } = useQuery(rulesQuery());
  if (error) return <ErrorState error={error} onRetry={() => void refetch()} />;
  if (!data || data.rules.length === 0) return null;
  return (
    <Panel
      className="mb-6"
      title="Rules adopted"
      subtitle="Figures as they stood on the day. The latest of a year is in force."
    >
      <Table caption="Rules adopted" rows={data.rules} columns={COLUMNS} rowKey={(row) => row.id} />
    </Panel>
  );
}

const COLUMNS: readonly Column<Rule>[] = [
  {
    id: 'year',
    header: 'For',
    heads: true,
    cell: (row) => (row.revision > 1 ? `${row.year}, revision ${row.revision}` : row.year),
  },
  { id: 'rule', header: 'Rule', number: true, cell: (row) => <Figures rule={row} /> },
  { id: 'level', header: 'To hold', cell: (row) => row.level.replace('/', ' in ') },
  { id: 'based', header: 'Based on', cell: (row) => <Based rule={row} /> },
  { id: 'adopted', header: 'Adopted', cell: (row) => <Adopted rule={row} /> },
];

function Figures({ rule }: { rule: Rule }) {
  const format = useFormatter();
  return <strong className="font-[640]">{ruleText(rule, format)}</strong>;
}

function Based({ rule }: { rule: Rule }) {
  const format = useFormatter();
  const { covered, scored } = rule.evidence;
  return (
    <span className="block min-w-44">
      {format.count(rule.rebuildCount, 'rebuild')} up to {format.day(rule.dataUntil)}
      <span className="block text-label text-soft">
        rules set this way had covered {covered} of {scored}
      </span>
    </span>
  );
}

function Adopted({ rule }: { rule: Rule }) {
  const format = useFormatter();
  return (
    <span className="block min-w-32">
      {format.day(rule.adoptedOn)}, {rule.adoptedByName}
      {rule.note && <span className="block text-label text-soft">{rule.note}</span>}
    </span>
  );
}
