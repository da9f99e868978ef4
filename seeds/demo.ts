import type { Services } from '../server/platform/http.ts';
import { adoptRules, areRulesAdopted } from './demo/adopt-rules.ts';
import { bookLedger, isLedgerBooked } from './demo/book-ledger.ts';
import { bringInSheets } from './demo/bring-in-sheets.ts';
import { demoBook } from './demo/generate.ts';
import { areSheetsKept, keepSheets } from './demo/keep-sheets.ts';
import { findDemoShop, gatherPeople, openDemoShop } from './demo/open-demo-shop.ts';
import { DEMO_MEMBERS, DEMO_OWNER, DEMO_PASSWORD, type DemoPerson } from './demo/people.ts';

/** The people whose names a visitor may sign in with, and their password. */
export interface DemoSignIns {
  readonly people: readonly DemoPerson[];
  readonly password: string;
}

/**
 * Fills an empty warehouse with the demo shop, through the same import and books as real ones, and says who may sign
 * in to it. Each step is done once: a start after a crash goes on where the last one stopped. Gives null, and does
 * nothing, where other shops have their books, or where the settings want no demo (in production; on an outside address
 * unless asked for).
 */
export async function seedDemo(services: Services): Promise<DemoSignIns | null> {
  if (!services.config.wantsDemo) return null;
  const found = await findDemoShop(services);
  if (!found && (await hasAccounts(services))) return null;
  const shop = found ?? (await openDemoShop(services));
  if (!(await isLedgerBooked(services, shop))) {
    await gatherPeople(services, shop);
    await bringInSheets(services, shop);
    await bookLedger(services, shop, demoBook());
  }
  if (!(await areRulesAdopted(services, shop))) await adoptRules(services, shop);
  if (!(await areSheetsKept(services, shop))) await keepSheets(services, shop);
  return { people: [DEMO_OWNER, ...DEMO_MEMBERS], password: DEMO_PASSWORD };
}

async function hasAccounts({ database }: Services): Promise<boolean> {
  return (await database.reader('users').first('id')) !== undefined;
}
