import type { ApiProblem } from '../../../lib/api-problem.ts';
import { Button } from '../../../ui/button.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { ErrorState } from '../../../ui/states.tsx';
import { ProgressBar } from '../progress-bar.tsx';
import type { Uploading } from './use-upload.ts';

/** The files that were chosen: how far they are on their way, or why they did not come and what can be done. */
export function ChosenFiles({ upload }: { upload: Uploading }) {
  const format = useFormatter();
  const { chosen, share, problem, isIn } = upload;
  if (chosen.length === 0) return null;
  const fine = chosen.filter(({ fault }) => fault === null);
  const names = fine.map(({ file }) => file.name).join(', ');
  if (share !== null)
    return (
      <section aria-label="On their way" className="panel grid gap-2">
        <p className="font-[640] break-words">
          Sending {fine.length === 1 ? names : `${format.count(fine.length, 'file')}: ${names}`}
        </p>
        <ProgressBar share={share} label="Share of the upload that has gone" />
      </section>
    );
  if (isIn)
    return (
      <section role="alert" className="panel grid justify-items-start gap-3 border-l-4 border-l-edge">
        <h2 className="text-lead font-bold">{names} is in already</h2>
        <p className="text-soft">{(problem as ApiProblem).message}</p>
        <Button onClick={() => void upload.send(true)}>Bring it in once more all the same</Button>
      </section>
    );
  const isListed = problem === null || chosen.length > 1;
  return (
    <>
      {problem !== null && <ErrorState error={problem} />}
      {isListed && <FileList upload={upload} />}
    </>
  );
}

function FileList({ upload }: { upload: Uploading }) {
  const { chosen } = upload;
  const fine = chosen.filter(({ fault }) => fault === null).length;
  const faulty = chosen.length - fine;
  return (
    <section role="alert" className="panel grid gap-3 border-l-4 border-l-oxide">
      <h2 className="text-lead font-bold">
        {faulty === 0
          ? 'Nothing came in. Leave out the file that is at fault, or put it right'
          : faulty === 1
            ? 'One file cannot come in'
            : `${faulty} files cannot come in`}
      </h2>
      <ul>
        {chosen.map(({ file, fault }) => (
          <li
            key={`${file.name}-${file.size}-${file.lastModified}`}
            className="flex flex-wrap items-baseline gap-x-4 border-t border-hair py-1.5"
          >
            <span className="min-w-0 font-[640] break-words">{file.name}</span>
            <span className={fault ? 'text-oxide' : 'text-soft'}>{fault ?? 'may come in'}</span>
            <button
              type="button"
              className="row-act ml-auto"
              aria-label={`Leave out ${file.name}`}
              onClick={() => upload.leaveOut(file)}
            >
              Leave out
            </button>
          </li>
        ))}
      </ul>
      {fine > 0 && (
        <Button className="justify-self-start" kind="main" onClick={() => void upload.send()}>
          {faulty === 0 ? 'Try again' : fine === 1 ? 'Bring in the other one' : `Bring in the other ${fine}`}
        </Button>
      )}
    </section>
  );
}
