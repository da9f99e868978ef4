import { useSuspenseQuery, useQueryClient } from '@tanstack/react-query';
import { Link, Navigate, useSearchParams } from 'react-router-dom';
import { SignInForm } from '../app/sign-in-form.tsx';
import { sessionQuery } from '../lib/session.ts';
import { Mark, PageHeader } from '../ui/answer-header.tsx';

const QUESTIONS = [
  'Did the work pay this year, counting your own hours?',
  'Which wrecks pay, and which only feel like it?',
  'Where does the money run over?',
  'How long until the money is back?',
  "How much cushion should next year's budgets carry?",
];

/** The way in, and in one glance what is behind it. `?to=` is the address that was asked for; only our own are followed. */
export function SignInPage() {
  const client = useQueryClient();
  const [search] = useSearchParams();
  const { data: session } = useSuspenseQuery(sessionQuery());
  const to = search.get('to');
  if (session) return <Navigate to={ownAddress(to)} replace />;
  return (
    <>
      <PageHeader
        title="What your own past says about the next car"
        note="For small shops that buy damaged vehicles, rebuild them and sell them."
      />
      <div className="grid items-start gap-x-12 gap-y-8 lg:grid-cols-[minmax(0,24rem)_minmax(0,30rem)]">
        <section className="panel" aria-labelledby="way-in">
          <h2 id="way-in" className="mb-4 text-lead font-[660]">
            Sign in to your shop
          </h2>
          {to !== null && <p className="mb-4 text-soft">Then you go on to the page that you asked for.</p>}
          <SignInForm onSignedIn={() => client.refetchQueries({ queryKey: sessionQuery().queryKey })} />
          <p className="mt-5 border-t border-hair pt-4 text-soft">
            New here? <Link to="/sign-up">Start a shop</Link>, with nothing but an old spreadsheet.
          </p>
        </section>
        <div className="grid gap-4">
          <p className="text-lead text-pretty">
            Each car feels like a win or a loss by itself. Panelgap measures the{' '}
            <Mark>gap between plan and outcome</Mark> over all of them, from the spreadsheets you have and the books you
            keep, and answers:
          </p>
          <ul className="grid gap-2 border-l-4 border-rule pl-4 font-[620]">
            {QUESTIONS.map((question) => (
              <li key={question}>{question}</li>
            ))}
          </ul>
          <p className="text-soft">Each answer says how sure it is, and opens to the rows behind it.</p>
        </div>
      </div>
    </>
  );
}

/** Only a path of our own; anything else would let a link lead a signed-in person elsewhere. */
function ownAddress(to: string | null): string {
  return to !== null && /^\/(?![/\\])/.test(to) ? to : '/';
}
