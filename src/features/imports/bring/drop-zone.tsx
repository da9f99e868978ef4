import { useRef, useState } from 'react';
import { Button } from '../../../ui/button.tsx';
import { ChosenFiles } from './chosen-files.tsx';
import { PasteDialog } from './paste-dialog.tsx';
import { usePaste } from './pasted.ts';
import { useFileDrop } from './use-file-drop.ts';
import { useUpload } from './use-upload.ts';

/** Takes files by dropping them or by a button, and cells by pasting. Files that are in already ask before they come again. */
export function DropZone({ onUploaded }: { onUploaded: (importId: string) => void }) {
  const upload = useUpload(onUploaded);
  const input = useRef<HTMLInputElement>(null);
  const [pasted, setPasted] = useState<string | null>(null);
  const isOver = useFileDrop(upload.take);
  usePaste((text) => setPasted(text));
  return (
    <div className="mb-6 grid gap-4">
      <section
        aria-label="Bring files in"
        className={`panel grid justify-items-start gap-3 border-dashed ${isOver ? 'border-ink bg-paper' : 'border-edge'}`}
      >
        <h2 className="text-lead font-[660]">{isOver ? 'Let go to bring it in' : 'Drop old spreadsheets here'}</h2>
        <p className="max-w-[42rem] text-soft">
          Workbooks (.xlsx, .ods) or sheets saved as text, as they are: lists of costs, one car per row, one sheet per
          car, hours. Several files that belong together come in as one. Nothing is booked before you have seen how
          every row was understood.
        </p>
        <input
          ref={input}
          type="file"
          multiple
          accept=".csv,.tsv,.tab,.txt,.xlsx,.xlsm,.ods,.xls,text/csv,text/plain,text/tab-separated-values"
          aria-label="File to bring in"
          className="sr-only"
          tabIndex={-1}
          onChange={(event) => {
            upload.take([...(event.target.files ?? [])]);
            event.target.value = '';
          }}
        />
        <div className="flex flex-wrap gap-3">
          <Button kind="main" busy={upload.share !== null} onClick={() => input.current?.click()}>
            Choose files
          </Button>
          <Button disabled={upload.share !== null} onClick={() => setPasted('')}>
            Paste cells
          </Button>
        </div>
      </section>
      <ChosenFiles upload={upload} />
      {pasted !== null && (
        <PasteDialog start={pasted} onFile={(file) => upload.take([file])} onClose={() => setPasted(null)} />
      )}
    </div>
  );
}
