import type { Role } from '#shared/vocabulary.ts';

/** One thing to find: a rebuild, a page, an action. `to` opens an address; `run` does something. */
export type PaletteItem = { id: string; label: string; note: string; to?: string; run?: () => void };

/** Where a shop's findable things come from beside its places. Each is asked once when the finder opens. */
export type PaletteSource = {
  key: string;
  /** Who may ask; nobody else's finder does. */
  roles: readonly Role[];
  load: (shopId: string) => Promise<PaletteItem[]>;
};

export const paletteSources: readonly PaletteSource[] = [
  { key: 'rebuilds', roles: ['owner', 'bookkeeper', 'accountant'], load: loadRebuilds },
];

// Contracts are loaded only here, so that the frame stays light until someone looks for something.
async function loadRebuilds(shopId: string): Promise<PaletteItem[]> {
  const [{ call }, { rebuildsApi }] = await Promise.all([
    import('../lib/api.ts'),
    import('#shared/contracts/rebuilds.ts'),
  ]);
  const names = await call(rebuildsApi.names);
  return names.map(({ id, tag, name, isOpen }) => ({
    id,
    label: name ? `${tag} · ${name}` : tag,
    note: isOpen ? 'Rebuild' : 'Rebuild, has left',
    to: `/s/${shopId}/rebuilds/${id}`,
  }));
}
