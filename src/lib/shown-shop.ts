let shopId: string | null = null;

/** The shop that the page shows, or null where none is shown. The router sets it; every request carries it. */
export function shownShop(): string | null {
  return shopId;
}

export function setShownShop(id: string | null): void {
  shopId = id;
}
