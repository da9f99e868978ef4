import type { Books } from '../../server/books/books.ts';
import { commit } from '../../server/books/write.ts';
import type { Services } from '../../server/platform/http.ts';
import { bookVehicle, entryFields } from './book-vehicle.ts';
import type { DemoBook, DemoVehicle } from './demo-book.ts';
import { type Names, namesOf } from './names.ts';
import type { DemoShop } from './open-demo-shop.ts';

const ACTION = 'fill demo shop';
/** Stands in the trail of the demo shop. */
const NOTE =
  'An invented shop. Its seed was chosen, not drawn, so that what is true of such shops on the whole can be seen in this one.';

/** Was the ledger written? It comes last, so then everything was. */
export async function isLedgerBooked({ database }: Services, { shopId }: DemoShop): Promise<boolean> {
  return (await database.reader('trail').where({ shop_id: shopId, action: ACTION }).first('number')) !== undefined;
}

/** Writes everything that never stood in a spreadsheet, in one write: the vehicles of the ledger and the overhead. */
export async function bookLedger({ database }: Services, shop: DemoShop, book: DemoBook): Promise<void> {
  const { shopId, ownerId, requestId } = shop;
  const write = { action: ACTION, subject: 'shop', once: null, toJson: (reply: unknown) => JSON.stringify(reply) };
  const vehicles = book.vehicles.filter(({ source }) => source === 'ledger');
  await commit(database, { shopId, userId: ownerId, requestId, ...write }, async (books) => {
    const names = await namesOf(books);
    await labelReceipts(books, names, book.vehicles);
    for (const vehicle of vehicles) await bookVehicle(books, names, vehicle);
    for (const entry of book.overhead) await books.entries.create(entryFields(entry, names));
    const after = { seed: book.seed, rebuilds: vehicles.length, overheadEntries: book.overhead.length, note: NOTE };
    return { id: shopId, before: null, after, reply: null };
  });
}

/** A list of receipts knows neither the shop's tag nor what hit the car: the owner adds that. */
async function labelReceipts(books: Books, names: Names, vehicles: readonly DemoVehicle[]): Promise<void> {
  const rebuilds = await books.rebuilds.list();
  for (const vehicle of vehicles.filter(({ source }) => source === 'receipts list')) {
    const rebuild = rebuilds.find(
      ({ boughtOn, model, importId }) =>
        importId !== null && boughtOn === vehicle.dates.boughtOn && model === vehicle.model,
    );
    if (!rebuild) throw new Error(`${vehicle.tag} is not in the list of receipts`);
    await books.rebuilds.update(rebuild.id, rebuild.version, {
      tag: vehicle.tag,
      classId: names.classId(vehicle.class),
      damageId: names.damageId(vehicle.damage),
    });
  }
}
