import type { GradedRule, RuleReview } from '#shared/contracts/answers-rule-review.ts';
import { GradeLine } from '../../../charts/grade-line.tsx';
import type { Formatter } from '#shared/formatter.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { RangeText } from '../range-text.tsx';
import { useShopPath } from '../rebuild-link.tsx';
import { levelWords } from '../sentences/contingency.ts';
import { expectedText, verdictWords } from '../sentences/rule-review.ts';

/** Every rule ever adopted with its grade: as a line, and as rows with who, when and on what. */
export function GradesPanel({ history }: Pick<RuleReview, 'history'>) {
  const format = useFormatter();
  const path = useShopPath();
  if (history.length === 0) return null;
  const grades = history.map((rule) => ({
    label: nameOf(rule),
    note: rule.record.n === 0 ? 'none yet' : `${rule.record.x} of ${rule.record.n}`,
    href: rule.isInForce ? path(`contingency/review?year=${rule.year}`) : undefined,
    share: shareOf(rule),
    rate: rule.record.rate,
    low: rule.record.lower,
    high: rule.record.upper,
  }));
  return (
    <Panel
      className="mb-6"
      title="How the rules have held, year by year"
      subtitle="Dot: share held of what was bought under the rule. Line: where it may lie in the long run. Dash: what it was set to hold."
    >
      <GradeLine caption={captionOf(history, format)} grades={grades} format={format} />
      <div className="mt-4">
        <Table
          caption="Rules adopted"
          rows={history.toReversed()}
          columns={COLUMNS}
          rowKey={(row) => row.id}
          rowProps={(row) => (row.isInForce ? { 'data-strong': '' } : {})}
        />
      </div>
    </Panel>
  );
}

function captionOf(history: readonly GradedRule[], format: Formatter): string {
  const [held, judged] = history.reduce(([x, n], { record }) => [x + record.x, n + record.n], [0, 0]);
  if (judged === 0) return 'Nothing bought under a rule is finished yet.';
  return `All rules together held ${format.number(held)} of ${format.number(judged)}.`;
}

/** `2026`, `2026, 2nd`. */
function nameOf({ year, revision, isInForce }: GradedRule): string {
  return isInForce ? `${year}` : `${year} no. ${revision}`;
}

function shareOf({ level }: GradedRule): number {
  const [p = 1, q = 2] = level.split('/').map(Number);
  return p / q;
}

const COLUMNS: readonly Column<GradedRule>[] = [
  {
    id: 'year',
    header: 'For',
    heads: true,
    cell: (row) => (
      <>
        {row.year}
        {(row.revision > 1 || !row.isInForce) && (
          <span className="block text-label font-normal text-soft">
            revision {row.revision}
            {!row.isInForce && ', replaced'}
          </span>
        )}
      </>
    ),
  },
  { id: 'rule', header: 'Rule', cell: (row) => <RuleCell rule={row} /> },
  { id: 'held', header: 'Held', cell: (row) => <HeldCell rule={row} /> },
  { id: 'based', header: 'Set on', under: 'tablet', cell: (row) => <BasedCell rule={row} /> },
  { id: 'adopted', header: 'Adopted', under: 'tablet', cell: (row) => <AdoptedCell rule={row} /> },
];

function RuleCell({ rule }: { rule: GradedRule }) {
  const format = useFormatter();
  const { percent, flatCents, level, evidence } = rule;
  const text = (share: number, cents: number | null) =>
    `${format.percent(share / 100)}${cents === null ? '' : ` and ${format.money(cents)}`}`;
  const isOther =
    evidence.askedPercent !== null && (evidence.askedPercent !== percent || evidence.askedFlatCents !== flatCents);
  return (
    <>
      <strong className="font-[640]">{text(percent, flatCents)}</strong>
      <span className="block text-label font-normal text-soft">
        to hold {levelWords(level)}
        {isOther && `; the books asked for ${text(evidence.askedPercent ?? 0, evidence.askedFlatCents)}`}
      </span>
    </>
  );
}

function HeldCell({ rule }: { rule: GradedRule }) {
  const format = useFormatter();
  const { record } = rule;
  const open = record.openCount > 0 ? `${record.openCount} not finished` : '';
  if (record.n === 0) return <span className="font-normal text-soft">none yet{open && `, ${open}`}</span>;
  return (
    <>
      {record.x} of {record.n}
      <span className="block text-label font-normal text-soft">
        <RangeText low={record.lower} high={record.upper} />; {expectedText(rule, format)}: {verdictWords(rule)}
        {open && `; ${open}`}
      </span>
    </>
  );
}

function BasedCell({ rule }: { rule: GradedRule }) {
  const format = useFormatter();
  const { covered, scored } = rule.evidence;
  return (
    <span className="font-normal whitespace-normal">
      {format.count(rule.rebuildCount, 'rebuild')} up to {format.day(rule.dataUntil)}
      {scored > 0 && (
        <span className="block text-label text-soft">
          rules set this way had covered {covered} of {scored}
        </span>
      )}
    </span>
  );
}

function AdoptedCell({ rule }: { rule: GradedRule }) {
  const format = useFormatter();
  const { review } = rule;
  const kept = review && `${review.decision} after ${review.year} held ${review.x} of ${review.n}`;
  return (
    <span className="font-normal whitespace-normal">
      {format.day(rule.adoptedOn)}, {rule.adoptedByName}
      {(kept || rule.note) && (
        <span className="block text-label text-soft">{[kept, rule.note].filter(Boolean).join('; ')}</span>
      )}
    </span>
  );
}
