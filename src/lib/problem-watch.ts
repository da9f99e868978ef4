import type { ApiProblem } from './api-problem.ts';

type Listener = (problem: ApiProblem) => void;

const listeners = new Set<Listener>();

/** Tells the frame of a problem that stands above any one page: a session that ended, another shop. */
export function reportProblem(problem: ApiProblem): void {
  for (const listener of listeners) listener(problem);
}

/** Listens until the returned function is called. */
export function watchProblems(listener: Listener): () => void {
  listeners.add(listener);
  return () => {
    listeners.delete(listener);
  };
}

export const isSessionEnded = (problem: ApiProblem) => problem.status === 401;
export const isOtherShop = (problem: ApiProblem) => problem.type === '/problems/other-shop';
