import type { Reading } from '#shared/contracts/import-reading.ts';
import { SHAPE_WORDS } from '../words.ts';

/** What a sheet is taken for and why, and what the signs of the grid mean. */
export function SheetNote({ reading, sheet }: { reading: Reading; sheet: number }) {
  const found = reading.sheets.find(({ number }) => number === sheet);
  const shape = found ? found.shape : reading.shape;
  return (
    <div className="mb-3 flex flex-wrap justify-between gap-x-6 gap-y-1 text-label text-soft">
      <p className="max-w-[38rem]">
        Taken for {shape ? SHAPE_WORDS[shape] : 'notes: it holds no table that could be read'}.
        {found?.isHidden && ' The sheet is hidden in the workbook.'}
        {found?.why && ` ${found.why}`}
      </p>
      <ul className="file-legend" aria-label="Signs">
        <li data-outcome="put aside">✕ put aside</li>
        <li data-outcome="not data">– no data</li>
        <li>
          <span className="legend-read">12.50</span> read as a figure
        </li>
        <li>
          <span className="legend-guess">~12</span> a guess
        </li>
      </ul>
    </div>
  );
}
