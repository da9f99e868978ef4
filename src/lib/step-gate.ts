type Gate = (event: PopStateEvent) => void;
let gate: Gate | null = null;

// Listens from the start: browsers call the window's listeners in the order in which they came, and the router's must come later.
window.addEventListener('popstate', (event) => gate?.(event));

/** Sees every step back and forward before the router does, and may stop it there. Returns what ends it. */
export function gateSteps(wanted: Gate): () => void {
  gate = wanted;
  return () => {
    gate = null;
  };
}
