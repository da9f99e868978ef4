import { useQueryClient } from '@tanstack/react-query';
import { useRef } from 'react';
import type { z } from 'zod';
import {
  type ListItem,
  type ListKind,
  type Shop,
  shopApi,
  type shopFieldsSchema,
  type Worker,
} from '#shared/contracts/shop.ts';
import { call, newIdempotencyKey } from '../../lib/api.ts';
import { listsQuery } from '../../lib/lists.ts';
import { useVersionedEdit } from '../../lib/use-versioned-edit.ts';
import { shopQuery } from './queries.ts';

export type ShopChange = Partial<z.output<typeof shopFieldsSchema>>;
export type ItemChange = { name?: string; position?: number; isRetired?: boolean };
export type WorkerChange = { name?: string; isPaid?: boolean; isRetired?: boolean };

/** The shop's words, currency, year and pay stand in every answer, list and in the session: all is read again. */
function useReadAgain() {
  const client = useQueryClient();
  return () => client.invalidateQueries();
}

/** Changes how the shop counts. */
export function useShopEdit() {
  const client = useQueryClient();
  const readAgain = useReadAgain();
  return useVersionedEdit<Shop, ShopChange>({
    send: async ({ version }, change) => {
      const after = await call(shopApi.update, { body: change, version });
      client.setQueryData(shopQuery().queryKey, after);
      await readAgain();
      return after;
    },
    latest: () => client.fetchQuery({ ...shopQuery(), staleTime: 0 }),
  });
}

/** Renames, moves, retires or brings back a word of one list. */
export function useItemEdit(kind: ListKind) {
  const client = useQueryClient();
  const readAgain = useReadAgain();
  return useVersionedEdit<ListItem, ItemChange>({
    send: async ({ id: itemId, version }, change) => {
      const after = await call(shopApi.changeItem, { params: { kind, itemId }, body: change, version });
      await readAgain();
      return after;
    },
    latest: async (before) => {
      const lists = await client.fetchQuery({ ...listsQuery(), staleTime: 0 });
      return lists[kind].find((item) => item.id === before.id) ?? before;
    },
  });
}

/** Renames a worker, says whether they are paid, retires them or brings them back. */
export function useWorkerEdit() {
  const client = useQueryClient();
  const readAgain = useReadAgain();
  return useVersionedEdit<Worker, WorkerChange>({
    send: async ({ id: workerId, version }, change) => {
      const after = await call(shopApi.changeWorker, { params: { workerId }, body: change, version });
      await readAgain();
      return after;
    },
    latest: async (before) => {
      const { workers } = await client.fetchQuery({ ...listsQuery(), staleTime: 0 });
      return workers.find((worker) => worker.id === before.id) ?? before;
    },
  });
}

/** Adds a word at the end of a list. */
export function useAddItem(kind: ListKind): (name: string) => Promise<void> {
  const readAgain = useReadAgain();
  const once = useOnce();
  return async (name) => {
    await once(name, (idempotencyKey) => call(shopApi.addItem, { params: { kind }, body: { name }, idempotencyKey }));
    await readAgain();
  };
}

/** Adds someone whose hours are kept, signed in or not. */
export function useAddWorker(): (worker: { name: string; isPaid: boolean }) => Promise<void> {
  const readAgain = useReadAgain();
  const once = useOnce();
  return async (body) => {
    await once(JSON.stringify(body), (idempotencyKey) => call(shopApi.addWorker, { body, idempotencyKey }));
    await readAgain();
  };
}

/** Sends the same thing under the same key until it went through: a second try after a lost reply adds nothing twice. */
function useOnce() {
  const open = useRef<{ what: string; key: string } | null>(null);
  return async (what: string, send: (key: string) => Promise<unknown>) => {
    if (open.current?.what !== what) open.current = { what, key: newIdempotencyKey() };
    await send(open.current.key);
    open.current = null;
  };
}
