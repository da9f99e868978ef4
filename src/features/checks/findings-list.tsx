import { CHECK_GRADES, type ChecksAnswer } from '#shared/contracts/checks.ts';
import { Panel } from '../../ui/panel.tsx';
import { FindingCard } from './finding-card.tsx';
import { GRADE_WORDS } from './words.ts';

/** All that was found, by how grave it is; what somebody said is right stands last. */
export function FindingsList(props: { answer: ChecksAnswer; shopPath: string; canSettle: boolean }) {
  const { answer, shopPath, canSettle } = props;
  const open = answer.findings.filter(({ count }) => count > 0);
  const settled = answer.findings.filter(({ count }) => count === 0);
  const panels = [
    ...CHECK_GRADES.map((grade) => ({ ...GRADE_WORDS[grade], findings: open.filter((one) => one.grade === grade) })),
    { title: 'Said to be right', note: 'Somebody looked at these. They can be opened again.', findings: settled },
  ];
  return (
    <div className="grid gap-6">
      {panels
        .filter(({ findings }) => findings.length > 0)
        .map(({ title, note, findings }) => (
          <Panel key={title} title={title} subtitle={note}>
            <ul>
              {findings.map((finding) => (
                <FindingCard key={finding.kind} {...{ finding, shopPath, canSettle }} />
              ))}
            </ul>
          </Panel>
        ))}
    </div>
  );
}
