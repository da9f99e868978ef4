import { type DragEvent, useRef, useState } from 'react';
import { ApiProblem } from '../../lib/api-problem.ts';
import { newIdempotencyKey } from '../../lib/api.ts';
import { Button } from '../../ui/button.tsx';
import { ErrorState } from '../../ui/states.tsx';
import { useImportWrites } from './mutations.ts';

/** Takes a file by dropping it or by a button. A file that is in already asks before it comes in again. */
export function DropZone({ onUploaded }: { onUploaded: (importId: string) => void }) {
  const { upload } = useImportWrites();
  const input = useRef<HTMLInputElement>(null);
  const [isOver, setOver] = useState(false);
  const [isBusy, setBusy] = useState(false);
  const [failed, setFailed] = useState<{ file: File; problem: unknown } | null>(null);

  async function send(file: File | undefined, importAnyway = false) {
    if (!file) return;
    setBusy(true);
    setFailed(null);
    try {
      onUploaded((await upload(file, newIdempotencyKey(), importAnyway)).id);
    } catch (problem) {
      setFailed({ file, problem });
    } finally {
      setBusy(false);
      if (input.current) input.current.value = '';
    }
  }
  const onDrop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    void send(event.dataTransfer.files[0]);
  };
  const isIn = failed?.problem instanceof ApiProblem && failed.problem.type === '/problems/already-in';
  return (
    <div className="mb-6 grid gap-4">
      <section
        aria-label="Bring a file in"
        onDragOver={(event) => {
          event.preventDefault();
          setOver(true);
        }}
        onDragLeave={() => setOver(false)}
        onDrop={onDrop}
        className={`panel grid justify-items-start gap-3 border-dashed ${isOver ? 'border-ink bg-paper' : 'border-edge'}`}
      >
        <h2 className="text-lead font-[660]">Drop an old spreadsheet here, saved as CSV</h2>
        <p className="max-w-[42rem] text-soft">
          A list with one cost per row and the car beside it, a sheet with one car per row, or a log of hours. Nothing
          is booked before you have seen how it was understood.
        </p>
        <input
          ref={input}
          type="file"
          accept=".csv,.tsv,.txt,text/csv,text/plain,text/tab-separated-values"
          aria-label="File to bring in"
          className="sr-only"
          tabIndex={-1}
          onChange={(event) => void send(event.target.files?.[0])}
        />
        <Button kind="main" busy={isBusy} onClick={() => input.current?.click()}>
          Choose a file
        </Button>
      </section>
      {failed && <ErrorState error={failed.problem} />}
      {failed && isIn && (
        <div>
          <Button busy={isBusy} onClick={() => void send(failed.file, true)}>
            Bring {failed.file.name} in once more all the same
          </Button>
        </div>
      )}
    </div>
  );
}
