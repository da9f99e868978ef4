/** One thing to find: a rebuild, a page, an action. `to` opens an address; `run` does something. */
export type PaletteItem = { id: string; label: string; note: string; to?: string; run?: () => void };

/** Where a shop's findable things come from beside its places. Each is asked once when the finder opens. */
export type PaletteSource = { key: string; load: (shopId: string) => Promise<PaletteItem[]> };

export const paletteSources: readonly PaletteSource[] = [];
