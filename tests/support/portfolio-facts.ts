import { hasFlows } from '../../server/domain/annual-return.ts';
import type { RebuildFacts } from '../../server/domain/facts.ts';
import { factsFromLines, flowsOf } from '../../server/domain/facts-from-lines.ts';
import { netFlows } from '../../server/domain/net-flows.ts';
import { type TiedUp, yearSpans } from '../../server/domain/years.ts';
import type { DocumentInput } from '../check/answers-document.ts';
import type { Portfolio } from './portfolio.ts';

/** Everything the answers need, summed straight from a portfolio's lines, with no warehouse between. */
export function portfolioInput(portfolio: Portfolio): DocumentInput {
  const books = portfolio.rebuilds.map(({ frame, lines }) => ({
    lines,
    facts: factsFromLines(frame, lines, 'paid labor'),
  }));
  const facts = books.map((book) => book.facts);
  const flows = netFlows(
    books.filter((book) => hasFlows(book.facts)).flatMap((book) => flowsOf(book.facts, book.lines)),
  );
  const spans = yearSpans({ ...portfolio, facts });
  return { ...portfolio, facts, flows, tiedUp: spans.map((span) => tiedUpOn(span.tiedUpOn, books)) };
}

function tiedUpOn(
  on: string,
  books: readonly { facts: RebuildFacts; lines: Portfolio['rebuilds'][number]['lines'] }[],
): TiedUp {
  const held = books.filter(({ facts }) => {
    const isBought = facts.boughtOn !== null && facts.boughtOn <= on;
    return isBought && (facts.exit === null || facts.exit.on > on);
  });
  const spent = held.map(({ facts, lines }) =>
    lines.reduce(
      (total, line) => total + (line.on === null || line.on <= on ? line.cents : 0),
      facts.purchaseCents ?? 0,
    ),
  );
  return { on, rebuildCount: held.length, cents: spent.reduce((a, b) => a + b, 0) };
}
