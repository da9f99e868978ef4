import { Link } from 'react-router-dom';
import type { Head, WithoutOne } from '#shared/contracts/answers-parts.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { RebuildLink, useShopPath } from './rebuild-link.tsx';

type Props = {
  answer: Pick<Head, 'leftOut'>;
  /** Rebuilds in the headline's figure. */
  n: number;
  /** The headline's figure in words, where it moves, and how it is written. */
  headline: string;
  withoutOne: WithoutOne | null;
  write: (value: number) => string;
  /** Where on the page of definitions the measure is told in full. */
  definition: string;
};

/** What every "How this is worked out" ends with: rows used, rows left out and why, what one rebuild changes, the definition. */
export function WorkedOutBasis({ answer, n, headline, withoutOne, write, definition }: Props) {
  const format = useFormatter();
  const path = useShopPath();
  const out = answer.leftOut.filter(({ count }) => count > 0);
  return (
    <>
      <p>
        Rows used: {format.count(n, 'rebuild')}.{' '}
        {out.length === 0 ? (
          'None left out.'
        ) : (
          <>
            Left out: {out.map(({ count, reason }) => `${format.number(count)} ${reason}`).join(', ')} (
            <a href="#left-out">which ones</a>).
          </>
        )}
      </p>
      {withoutOne && (
        <p className="tabular-nums">
          One rebuild changes this: without <RebuildLink rebuild={withoutOne.rebuild} short /> {headline} would be{' '}
          {write(withoutOne.value)}.
        </p>
      )}
      <p>
        <Link to={path(`definitions#${definition}`)}>The definition in full</Link>
      </p>
    </>
  );
}
