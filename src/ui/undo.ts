import { notify } from './toast.tsx';

/** Waits for an undo and says how it went: it may come too late, when someone has changed the row since. */
export async function tryUndo(undo: Promise<unknown>): Promise<void> {
  try {
    await undo;
    notify('Taken back');
  } catch {
    notify('it was changed meanwhile, so it stays', { wrong: true });
  }
}
