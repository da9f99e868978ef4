import { Button } from './button.tsx';

type Unsent<Typed> = {
  readonly key: string;
  readonly typed: Typed;
  readonly problem: { readonly message: string } | null;
};

type Props<Typed> = {
  unsent: readonly Unsent<Typed>[];
  /** What was typed, in a few words. */
  words: (typed: Typed) => string;
  onRetry: (key: string) => void;
  onDrop: (key: string) => void;
  onEdit: (key: string, typed: Typed) => void;
};

/** Lines typed but not yet saved. One that failed says why and waits: nothing typed is lost. */
export function UnsentList<Typed>({ unsent, words, onRetry, onDrop, onEdit }: Props<Typed>) {
  if (unsent.length === 0) return null;
  return (
    <ul className="mb-4 grid gap-2" aria-label="Not saved yet">
      {unsent.map(({ key, typed, problem }) => (
        <li key={key} className={`unsent ${problem ? 'unsent-failed' : ''}`}>
          <span className="tabular-nums">{words(typed)}</span>
          {problem === null ? (
            <span>saving …</span>
          ) : (
            <>
              <span role="alert" className="font-semibold text-oxide">
                Not saved: {problem.message}
              </span>
              <Button size="small" onClick={() => onRetry(key)}>
                Try again
              </Button>
              <Button size="small" onClick={() => onEdit(key, typed)}>
                Change it
              </Button>
              <Button size="small" kind="plain" onClick={() => onDrop(key)}>
                Drop it
              </Button>
            </>
          )}
        </li>
      ))}
    </ul>
  );
}
