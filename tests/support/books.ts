import type { Entry } from '#shared/contracts/ledger.ts';
import type { Estimate } from '#shared/contracts/estimates.ts';
import type { Rebuild, RebuildDetail, RebuildRow } from '#shared/contracts/rebuilds.ts';
import type { Lists } from '#shared/contracts/shop.ts';
import type { Member } from './api.ts';

/** The books as a test writes them: through the API, by what things are called. Throws if a write is refused. */
export async function booksOf(member: Member) {
  const lists: Lists = (await member.get('/api/shop/lists')).body;
  let count = 0;
  const categoryId = (name = 'parts') => idOf(lists.categories, name);

  async function made<T>(reply: PromiseLike<{ status: number; body: T; text: string }>): Promise<T> {
    const { status, body, text } = await reply;
    if (status > 299) throw new Error(`the API answered ${status}: ${text}`);
    return body;
  }

  return {
    lists,
    categoryId,
    classId: (name: string) => idOf(lists.classes, name),
    damageId: (name: string) => idOf(lists.damages, name),
    rebuild: (fields: object = {}): Promise<Rebuild> => {
      count += 1;
      return made(member.post('/api/rebuilds', { tag: `B-${String(count).padStart(3, '0')}`, ...fields }));
    },
    detail: (id: string): Promise<RebuildDetail> => made(member.get(`/api/rebuilds/${id}`)),
    row: async (id: string): Promise<RebuildRow> => (await made<RebuildDetail>(member.get(`/api/rebuilds/${id}`))).row,
    entry: (fields: object): Promise<Entry> =>
      made(member.post('/api/entries', { categoryId: categoryId(), datedOn: '2026-03-01', ...fields })),
    hours: (fields: object) =>
      made<{ id: string; version: number; isPaid: boolean }>(member.post('/api/hours', fields)),
    plan: (rebuildId: string, lines: Record<string, number>, more: object = {}): Promise<Estimate> =>
      made(member.post(`/api/rebuilds/${rebuildId}/estimates`, planBody(lines, categoryId, more))),
    lock: (estimate: Estimate): Promise<Estimate> =>
      made(
        member
          .request('post', `/api/rebuilds/${estimate.rebuildId}/estimates/${estimate.id}/lock`)
          .set('If-Match', `"${estimate.version}"`),
      ),
    voidEntry: (entry: { id: string; version: number }, reason = 'entered twice') =>
      made<Entry>(
        member.request('post', `/api/entries/${entry.id}/void`).set('If-Match', `"${entry.version}"`).send({ reason }),
      ),
  };
}

export type TestBooks = Awaited<ReturnType<typeof booksOf>>;

function planBody(lines: Record<string, number>, categoryId: (name: string) => string, more: object) {
  return {
    lines: Object.entries(lines).map(([name, cents]) => ({ categoryId: categoryId(name), cents })),
    plannedSeconds: null,
    expectedSaleCents: null,
    expectedDays: null,
    note: null,
    ...more,
  };
}

function idOf(list: readonly { id: string; name: string }[], name: string): string {
  const item = list.find((one) => one.name === name);
  if (!item) throw new Error(`no ${name} in this shop's lists`);
  return item.id;
}
