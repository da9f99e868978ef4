// Runs before the first paint: a scheme chosen by hand wins over the system's, and nothing flashes.
(() => {
  try {
    const chosen = localStorage.getItem('panelgap-theme');
    if (chosen === 'light' || chosen === 'dark') document.documentElement.dataset.theme = chosen;
  } catch {
    // Storage may be closed to us; the system's scheme stands.
  }
})();
