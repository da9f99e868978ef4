import { openBooks } from '../../server/books/books.ts';
import { openShop } from '../../server/books/new-shop.ts';
import { shopScope } from '../../server/books/scope.ts';
import { joinShop } from '../../server/features/people/join-shop.ts';
import { memberStore } from '../../server/features/people/store.ts';
import { userStore } from '../../server/features/session/store.ts';
import type { Services } from '../../server/platform/http.ts';
import { newId } from '../../server/platform/ids.ts';
import { DEFAULT_CATEGORIES } from '#shared/vocabulary.ts';
import { DEMO_CLASSES, DEMO_DAMAGES, DEMO_TODAY } from './parameters.ts';
import { DEMO_MECHANIC, DEMO_MEMBERS, DEMO_OWNER, DEMO_PASSWORD, type DemoPerson } from './people.ts';

/** The open shop and who writes in it. */
export interface DemoShop {
  readonly shopId: string;
  readonly ownerId: string;
  /** Under this name the seed stands in the trail. */
  readonly requestId: string;
}

const REQUEST = 'demo';

/** The demo shop of this warehouse, if it was opened already. */
export async function findDemoShop({ database }: Services): Promise<DemoShop | null> {
  const owner = await userStore(database.reader).findByEmail(DEMO_OWNER.email);
  const shop = await database.reader('shops').where({ is_demo: 1 }).first<{ id: string } | undefined>('id');
  return owner && shop ? { shopId: shop.id, ownerId: owner.id, requestId: REQUEST } : null;
}

/** Opens Pennywhistle Yard with its owner. */
export async function openDemoShop({ database, passwords }: Services): Promise<DemoShop> {
  const ownerId = newId();
  const passwordHash = await passwords.hash(DEMO_PASSWORD);
  const shopId = await database.lock(() =>
    database.writer.transaction(async (trx) => {
      await userStore(trx).create({ id: ownerId, email: DEMO_OWNER.email, name: DEMO_OWNER.name, passwordHash });
      return openShop(trx, shopOf(ownerId), REQUEST);
    }),
  );
  return { shopId, ownerId, requestId: REQUEST };
}

/** Everyone but the owner joins by an invitation, as people do; the two who work stand in the list of workers. */
export async function gatherPeople(services: Services, shop: DemoShop): Promise<void> {
  const users = userStore(services.database.reader);
  for (const person of DEMO_MEMBERS) {
    if (!(await users.findByEmail(person.email))) await join(services, shop, person);
  }
  const mechanic = await users.findByEmail(DEMO_MECHANIC.email);
  await nameWorkers(services, shop, mechanic?.id ?? null);
}

function shopOf(ownerId: string) {
  return {
    name: 'Pennywhistle Yard',
    ownerId,
    timeZone: 'America/Chicago',
    currency: 'USD',
    locale: 'en-US',
    yearStartMonth: 1,
    wantedCentsPerHour: 2_500,
    fixedToday: DEMO_TODAY,
    lists: { classes: DEMO_CLASSES, damages: DEMO_DAMAGES, categories: DEFAULT_CATEGORIES },
  };
}

async function join(services: Services, shop: DemoShop, person: DemoPerson): Promise<void> {
  const { database, now } = services;
  const { token } = await database.lock(() =>
    database.writer.transaction((trx) =>
      memberStore(shopScope(trx, shop.shopId)).invite(person.email, person.role, shop.ownerId, now()),
    ),
  );
  const wish = { token, name: person.name, password: DEMO_PASSWORD };
  await joinShop(services, wish, { source: REQUEST, requestId: REQUEST });
}

/** The owner works unpaid, the mechanic is paid. */
function nameWorkers({ database }: Services, shop: DemoShop, mechanicId: string | null): Promise<void> {
  return database.lock(() =>
    database.writer.transaction(async (trx) => {
      const { lists } = openBooks(trx, shop.shopId, shop.ownerId);
      if ((await lists.all()).workers.length > 0) return;
      await lists.addWorker({ name: DEMO_OWNER.name, isPaid: false, userId: shop.ownerId });
      await lists.addWorker({ name: DEMO_MECHANIC.name, isPaid: true, userId: mechanicId });
    }),
  );
}
