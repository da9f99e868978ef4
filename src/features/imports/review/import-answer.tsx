import type { ReactNode } from 'react';
import type { Reading } from '#shared/contracts/import-reading.ts';
import type { Import } from '#shared/contracts/imports.ts';
import { AnswerHeader, Mark } from '../../../ui/answer-header.tsx';
import { Money } from '../../../ui/figures.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';

/** The page's question and its answer, as the import stands. `actions` stand at the right. */
export function ImportAnswer({ file, actions }: { file: Import; actions?: ReactNode }) {
  return (
    <AnswerHeader
      question="Is it all in, and does it agree?"
      title={`Import of ${file.fileName}`}
      filters={actions}
      answer={<Answer file={file} />}
      caution={file.reading && file.state !== 'refused' ? <CautionLine reading={file.reading} file={file} /> : null}
    />
  );
}

function Answer({ file }: { file: Import }) {
  const { state, fileName, reading } = file;
  if (state === 'reading') return <>Reading {fileName}.</>;
  if (state === 'committing') return <>Booking {fileName}. All of it will stand in the books at once, or none of it.</>;
  if (state === 'refused') return <>{fileName} cannot come in as it is.</>;
  if (state === 'discarded' || !reading) return <>{fileName} was dropped. Nothing of it was booked.</>;
  if (state === 'undone') return <>{fileName} was taken out again: the books are as they were before it.</>;
  return <InSentence reading={reading} isBooked={state === 'committed'} />;
}

function InSentence({ reading, isBooked }: { reading: Reading; isBooked: boolean }) {
  const format = useFormatter();
  const { control, statedTotals } = reading;
  const differ = statedTotals.filter((total) => total.stated !== total.imported).length;
  const agreement =
    statedTotals.length === 0
      ? 'the file states no totals to hold it against'
      : differ === 0
        ? 'it agrees with every total that the file states'
        : statedTotals.length === 1
          ? 'the one total that the file states differs'
          : `${differ} of the ${statedTotals.length} totals that the file states ${differ === 1 ? 'differs' : 'differ'}`;
  return (
    <>
      {isBooked ? 'In the books:' : 'Ready to come in:'}{' '}
      <Mark>
        {format.number(control.taken)} of {format.number(control.taken + control.putAside)} rows
      </Mark>{' '}
      about {format.number(control.rebuilds)} {control.rebuilds === 1 ? 'rebuild' : 'rebuilds'}; {agreement}.
    </>
  );
}

function CautionLine({ reading, file }: { reading: Reading; file: Import }) {
  const format = useFormatter();
  const { control } = reading;
  return (
    <>
      {control.putAside === 0
        ? 'No row is put aside'
        : `${format.number(control.putAside)} ${control.putAside === 1 ? 'row is' : 'rows are'} put aside`}
      {control.putAsideCents !== 0 && (
        <>
          , with <Money cents={control.putAsideCents} shown="always" /> readable on them
        </>
      )}
      ; {format.number(control.notData)} {control.notData === 1 ? 'holds' : 'hold'} no data.
      {file.state === 'ready' && ' Nothing is booked yet.'}
      {reading.remarks.map((remark) => ` ${remark}`)}
    </>
  );
}
