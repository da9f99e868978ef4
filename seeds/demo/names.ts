import type { Books } from '../../server/books/books.ts';
import { DEMO_MECHANIC, DEMO_OWNER } from './people.ts';

/** Ids of the demo shop's own words, found by name. */
export interface Names {
  classId(name: string): string;
  damageId(name: string): string;
  categoryId(name: string): string;
  readonly ownerWorkerId: string;
  readonly helperWorkerId: string;
}

export async function namesOf({ lists }: Books): Promise<Names> {
  const { classes, damages, categories, workers } = await lists.all();
  const workerId = finder(workers);
  return {
    classId: finder(classes),
    damageId: finder(damages),
    categoryId: finder(categories),
    ownerWorkerId: workerId(DEMO_OWNER.name),
    helperWorkerId: workerId(DEMO_MECHANIC.name),
  };
}

function finder(items: readonly { readonly id: string; readonly name: string }[]): (name: string) => string {
  const ids = new Map(items.map(({ id, name }) => [name, id]));
  return (name) => {
    const id = ids.get(name);
    if (id === undefined) throw new Error(`The demo shop knows no ${name}`);
    return id;
  };
}
