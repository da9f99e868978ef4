import type { ReactNode } from 'react';
import type { Column, Reading } from '#shared/contracts/import-reading.ts';
import type { ImportRow } from '#shared/contracts/imports.ts';
import { type Place, rowKey, sheetName } from '../place.ts';
import { MeaningField } from '../review/meaning-field.tsx';
import type { Settings } from '../use-settings.ts';
import { ASIDE_WORDS, HINT_WORDS, meaningWords, OUTCOME_WORDS, reasonWords } from '../words.ts';
import { RowCells } from './row-cells.tsx';
import type { Facts } from './row-facts.ts';
import { RowLines } from './row-lines.tsx';

type Shared = {
  reading: Reading;
  settings: Settings;
  canChange: boolean;
  place: Place;
  onPlace: (place: Place) => void;
};

type RowProps = Shared & {
  row: ImportRow;
  facts: Facts;
  onDone: () => void;
  entryTo: (entryId: string) => string;
};

/** What was understood of one row: how it ended and why, its lines, and its cells. */
export function RowDetail({ row, reading, facts, settings, canChange, place, onPlace, onDone, entryTo }: RowProps) {
  const asides = facts.asides.get(rowKey(row)) ?? [];
  const hints = facts.hints.get(rowKey(row)) ?? [];
  const sheet = sheetName(reading, row.sheet);
  const partly = row.outcome === 'taken' ? asides : [];
  return (
    <>
      <DetailHead title={sheet === null ? `Row ${row.row}` : `${sheet}, row ${row.row}`} outcome={row.outcome}>
        {settings.isLeftOut(row) ? 'Left out by you' : OUTCOME_WORDS[row.outcome]}
        {row.outcome !== 'taken' && row.reason && `: ${lower(reasonWords(row.reason))}`}
        {partly.map((aside) => `, except one cell: ${lower(ASIDE_WORDS[aside.reason])}`)}
      </DetailHead>
      {row.outcome === 'taken' && <RowLines {...{ row, reading, onPlace, entryTo }} />}
      {hints.map((hint) => (
        <p key={`${hint.kind}-${hint.col}`} className="hint-note">
          {HINT_WORDS[hint.kind]}
          {hint.text && `: ${hint.text}`}
        </p>
      ))}
      <RowCells
        key={rowKey(row)}
        {...{ row, reading, asides, settings, canChange, onPlace, onDone }}
        hotCol={place.col}
      />
    </>
  );
}

/** What a column is taken for and why, with a way to say otherwise. */
export function ColumnDetail(props: Shared & { column: Column; categories: readonly string[] }) {
  const { column, reading, settings, canChange, categories } = props;
  const from = reading.rememberedFrom;
  return (
    <>
      <DetailHead title={column.heading || `Column ${column.col}`}>The whole column</DetailHead>
      {canChange ? (
        <MeaningField {...{ column, settings, categories }} />
      ) : (
        <p className="font-[660]">{meaningWords(column)}</p>
      )}
      <p className="text-soft">{column.why}</p>
      {from && <p className="text-soft">As you said for {from.fileName}, which has the same headings.</p>}
      <ul className="row-cells" aria-label="First values">
        {column.samples.map((sample, at) => (
          <li key={at} className="break-words">
            {sample}
          </li>
        ))}
      </ul>
    </>
  );
}

function DetailHead({ title, outcome, children }: { title: string; outcome?: string; children: ReactNode }) {
  return (
    <div className="detail-head" data-outcome={outcome}>
      <h3 className="text-lead font-[660]">{title}</h3>
      <p>{children}</p>
    </div>
  );
}

/** A reason in the middle of a sentence. */
const lower = (words: string) => words.charAt(0).toLowerCase() + words.slice(1);
