import { type ComponentType, lazy } from 'react';
import { ErrorState } from '../ui/states.tsx';

/** A page in a file of its own. Where that file cannot be had, without signal or after an update, the page says so. */
export function lazyPage(load: () => Promise<ComponentType>) {
  return lazy(async () => ({ default: await load().catch(() => PageNotLoaded) }));
}

const NOT_LOADED = { title: 'This page could not be loaded', detail: 'Check the connection and try again.' };

/** Only loading anew asks for the file once more: the browser remembers that it failed. */
function PageNotLoaded() {
  return <ErrorState error={NOT_LOADED} onRetry={() => location.reload()} />;
}
