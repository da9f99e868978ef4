import type { Books } from '../../server/books/books.ts';
import { pooledFlows } from '../../server/books/flows.ts';
import { openShop } from '../../server/books/new-shop.ts';
import { readShopFacts, type ShopRebuild } from '../../server/books/shop-facts.ts';
import { tiedUpOn } from '../../server/books/spent-by.ts';
import { commit } from '../../server/books/write.ts';
import type { RebuildFacts } from '../../server/domain/facts.ts';
import { yearSpans } from '../../server/domain/years.ts';
import { type Database, rawHandle } from '../../server/platform/database.ts';
import { newId } from '../../server/platform/ids.ts';
import type { Portfolio, PortfolioRebuild } from '../support/portfolio.ts';
import type { DocumentInput } from './answers-document.ts';
import { distinctNames } from './distinct-names.ts';

const PAID_LABOR = 'paid labor';
const OVERHEAD = 'overhead';

/**
 * Loads a portfolio into a warehouse through the books' own code, as one write, and gives what the answers are worked
 * out from, read back the way the product reads it.
 */
export async function loadPortfolio(database: Database, portfolio: Portfolio): Promise<DocumentInput> {
  const names = namesOf(portfolio);
  const { shopId, ownerId } = await shopFor(database, portfolio, names);
  await commit(
    database,
    {
      action: 'load portfolio',
      subject: 'shop',
      shopId,
      userId: ownerId,
      requestId: 'answers-check',
      once: null,
      toJson: () => 'null',
    },
    async (books) => {
      const ids = await listIds(books);
      for (const rebuild of portfolio.rebuilds) await writeRebuild(books, rebuild, names, ids);
      const categoryId = ids.categories.get(names.categories.keptAs(OVERHEAD)) ?? '';
      for (const { on, cents } of portfolio.overhead) await books.entries.create({ categoryId, datedOn: on, cents });
      return { id: shopId, before: null, after: { rebuilds: portfolio.rebuilds.length }, reply: null };
    },
  );
  return readBack(database, shopId, portfolio, names);
}

type Names = ReturnType<typeof namesOf>;

function namesOf({ rebuilds }: Portfolio) {
  const some = (values: readonly (string | null)[]) => distinctNames(values.filter((value) => value !== null));
  return {
    tags: some(rebuilds.map(({ frame }) => frame.id)),
    classes: some(rebuilds.map(({ frame }) => frame.class)),
    damages: some(rebuilds.map(({ frame }) => frame.damage)),
    categories: some([
      ...rebuilds.flatMap(({ frame, lines }) => [...frame.estimates.keys(), ...lines.map((line) => line.category)]),
      OVERHEAD,
    ]),
  };
}

async function shopFor(database: Database, portfolio: Portfolio, { classes, damages, categories }: Names) {
  const ownerId = newId();
  const created_at = new Date().toISOString();
  const owner = { id: ownerId, email: 'owner@shop.example', name: 'Owner', password_hash: '-', created_at };
  const lists = {
    classes: classes.all,
    damages: damages.all,
    categories: categories.all.map((name) => ({ name, isPaidLabor: name === PAID_LABOR })),
  };
  const shopId = await database.writer.transaction(async (trx) => {
    await trx('users').insert(owner);
    const { name, startMonth: yearStartMonth, wantedCentsPerHour } = portfolio;
    const shop = { name, ownerId, timeZone: 'UTC', yearStartMonth, wantedCentsPerHour, lists };
    return openShop(trx, shop, 'answers-check');
  });
  return { shopId, ownerId };
}

async function listIds({ lists }: Books) {
  const { classes, damages, categories } = await lists.all();
  const byName = (list: readonly { id: string; name: string }[]) => new Map(list.map(({ id, name }) => [name, id]));
  return { classes: byName(classes), damages: byName(damages), categories: byName(categories) };
}

async function writeRebuild(
  books: Books,
  { frame, lines }: PortfolioRebuild,
  names: Names,
  ids: Awaited<ReturnType<typeof listIds>>,
): Promise<void> {
  const { exit, ownSeconds, paidSeconds, estimates } = frame;
  const categoryOf = (name: string) => ids.categories.get(names.categories.keptAs(name)) ?? '';
  const { id: rebuildId } = await books.rebuilds.create({
    tag: names.tags.keptAs(frame.id),
    classId: frame.class === null ? null : (ids.classes.get(names.classes.keptAs(frame.class)) ?? null),
    damageId: frame.damage === null ? null : (ids.damages.get(names.damages.keptAs(frame.damage)) ?? null),
    isSeen: frame.seen,
    purchaseCents: frame.purchaseCents,
    boughtOn: frame.boughtOn,
    roadworthyOn: frame.readyOn,
    listedOn: frame.listedOn,
    ...(exit?.kind === 'sold' && { soldOn: exit.on, saleCents: exit.proceedsCents }),
    ...(exit && exit.kind !== 'sold' && { exitKind: exit.kind, exitOn: exit.on, exitCents: exit.proceedsCents }),
  });
  if (estimates.size > 0) {
    const plan = [...estimates].map(([name, cents]) => ({ categoryId: categoryOf(name), cents }));
    const rest = { plannedSeconds: null, expectedSaleCents: null, expectedDays: null, note: null };
    const estimate = await books.estimates.create(rebuildId, { lines: plan, ...rest }, frame.boughtOn ?? '2000-01-01');
    await books.estimates.lock(estimate.id, estimate.version);
  }
  // Totals without a day: a kind of hours that the portfolio does not know must stay unknown.
  if (ownSeconds !== null) await books.hours.create({ rebuildId, seconds: ownSeconds, isPaid: false });
  if (paidSeconds !== null) await books.hours.create({ rebuildId, seconds: paidSeconds, isPaid: true });
  for (const line of lines) {
    await books.entries.create({
      rebuildId,
      categoryId: categoryOf(line.category),
      datedOn: line.on,
      cents: line.cents,
      foreseen: line.isForeseen === null ? null : line.isForeseen ? 'foreseen' : 'surprise',
      isExtra: line.isExtra,
      freeValueCents: line.freeCents,
    });
  }
}

async function readBack(
  database: Database,
  shopId: string,
  portfolio: Portfolio,
  names: Names,
): Promise<DocumentInput> {
  const raw = await rawHandle(database.reader);
  const shop = readShopFacts(raw, shopId);
  const { format, name, asOf } = portfolio;
  const { rebuilds, overhead, startMonth, wantedCentsPerHour } = shop;
  const spans = yearSpans({ facts: rebuilds, overhead, asOf, startMonth });
  return {
    format,
    name,
    asOf,
    startMonth,
    wantedCentsPerHour,
    overhead,
    flows: pooledFlows(
      raw,
      shopId,
      rebuilds.map(({ id }) => id),
    ),
    facts: rebuilds.map((rebuild) => inOriginalNames(rebuild, names)),
    tiedUp: spans.map(({ tiedUpOn: on }) => tiedUpOn(raw, shopId, rebuilds, on)),
  };
}

function inOriginalNames(rebuild: ShopRebuild, { tags, classes, damages, categories }: Names): RebuildFacts {
  const renamed = <T>(map: ReadonlyMap<string, T>) =>
    new Map([...map].map(([name, value]) => [categories.originalOf(name), value]));
  return {
    ...rebuild,
    id: tags.originalOf(rebuild.tag),
    class: rebuild.class === null ? null : classes.originalOf(rebuild.class),
    damage: rebuild.damage === null ? null : damages.originalOf(rebuild.damage),
    estimates: renamed(rebuild.estimates),
    categories: renamed(rebuild.categories),
  };
}
