import { gateSteps } from '../lib/step-gate.ts';
import { hasUnsaved, leaveBy } from '../lib/unsaved.ts';

type Place = { pathname: string; index: number };

/** Where the window stands, and how many pages of ours lie before it; the router keeps that number with each of them. */
export function placeNow(): Place {
  return { pathname: location.pathname, index: (history.state as { idx?: number } | null)?.idx ?? 0 };
}

/**
 * Holds up every way out of a page on which something is not saved: links, back and forward, and the window itself.
 * `shown` is the page that stands there. Returns what ends it.
 */
export function watchLeaving(navigate: (to: string) => void, shown: () => Place): () => void {
  /** What the next step through the history is: a person's, back to where they stood, or on where they had wanted. */
  let step: 'theirs' | 'undone' | 'allowed' = 'theirs';

  const onClick = (event: MouseEvent) => {
    const link = event.target instanceof Element ? event.target.closest('a[href]') : null;
    if (!hasUnsaved() || !(link instanceof HTMLAnchorElement) || !isOurs(event, link)) return;
    event.preventDefault();
    event.stopPropagation();
    leaveBy(() => navigate(link.pathname + link.search + link.hash));
  };
  const onStep = (event: PopStateEvent) => {
    const was = step;
    step = 'theirs';
    if (was === 'undone') event.stopImmediatePropagation();
    const { pathname, index } = placeNow();
    const back = shown().index - index;
    if (was !== 'theirs' || !hasUnsaved() || back === 0 || pathname === shown().pathname) return;
    event.stopImmediatePropagation();
    step = 'undone';
    history.go(back);
    leaveBy(() => {
      step = 'allowed';
      history.go(-back);
    });
  };
  const onUnload = (event: BeforeUnloadEvent) => {
    if (hasUnsaved()) event.preventDefault();
  };
  document.addEventListener('click', onClick, true);
  const endGate = gateSteps(onStep);
  window.addEventListener('beforeunload', onUnload);
  return () => {
    document.removeEventListener('click', onClick, true);
    endGate();
    window.removeEventListener('beforeunload', onUnload);
  };
}

/** A plain press on a link to another page of ours. */
function isOurs(event: MouseEvent, link: HTMLAnchorElement): boolean {
  const isPlain = event.button === 0 && !event.metaKey && !event.ctrlKey && !event.shiftKey && !event.altKey;
  return isPlain && !link.target && link.origin === location.origin && link.pathname !== location.pathname;
}
