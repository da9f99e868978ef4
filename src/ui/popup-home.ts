import { createContext, type RefObject, use } from 'react';

/** Looked up when a popup opens: while the first page is drawn, its landmark is not there yet. */
const page: RefObject<HTMLElement | null> = {
  get current() {
    return document.getElementById('main') ?? document.body;
  },
};

/** The element that popups of fields and menus hang in: an open dialog, else the page. Landmarks hold them, so readers find them. */
export const PopupHome = createContext<RefObject<HTMLElement | null>>(page);

export function usePopupHome(): RefObject<HTMLElement | null> {
  return use(PopupHome);
}
