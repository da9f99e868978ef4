import { useRef, useState } from 'react';
import { ApiProblem } from '../../../lib/api-problem.ts';
import { newIdempotencyKey } from '../../../lib/api.ts';
import { useImportWrites } from '../mutations.ts';
import { faultsOf } from './file-faults.ts';

export type Chosen = { readonly file: File; readonly fault: string | null };

/**
 * Sends files as one import. Files that all may come are sent at once; otherwise they wait in `chosen`, each with its
 * fault, until `send` goes without the faulty ones. After a refusal they are still there.
 */
export function useUpload(onUploaded: (importId: string) => void) {
  const writes = useImportWrites();
  const [chosen, setChosen] = useState<readonly Chosen[]>([]);
  const [share, setShare] = useState<number | null>(null);
  const [problem, setProblem] = useState<unknown>(null);
  const isBusy = useRef(false);
  // One for each set of files, so that a second try after no reply brings nothing in twice.
  const key = useRef(newIdempotencyKey());

  async function upload(files: readonly File[], importAnyway: boolean) {
    if (isBusy.current || files.length === 0) return;
    isBusy.current = true;
    setProblem(null);
    setShare(0);
    try {
      const request = { files, importAnyway, idempotencyKey: key.current, onProgress: setShare };
      onUploaded((await writes.upload(request)).id);
    } catch (refused) {
      setProblem(refused);
    } finally {
      isBusy.current = false;
      setShare(null);
    }
  }
  return {
    chosen,
    /** How much has gone, 0–1; null = nothing is being sent. */
    share,
    problem,
    isIn: problem instanceof ApiProblem && problem.type === '/problems/already-in',
    take(files: readonly File[]) {
      if (isBusy.current) return;
      const found = faultsOf(files);
      key.current = newIdempotencyKey();
      setChosen(found);
      setProblem(null);
      if (found.every(({ fault }) => fault === null)) void upload(files, false);
    },
    leaveOut(file: File) {
      key.current = newIdempotencyKey();
      setProblem(null);
      setChosen((before) => before.filter((one) => one.file !== file));
    },
    send(importAnyway = false) {
      const fine = chosen.filter(({ fault }) => fault === null);
      if (importAnyway) key.current = newIdempotencyKey();
      if (fine.length < chosen.length) setChosen(fine);
      return upload(
        fine.map(({ file }) => file),
        importAnyway,
      );
    },
  };
}

export type Uploading = ReturnType<typeof useUpload>;
