/**
 * jsdom lays nothing out and does not scroll; the grid of a file draws the rows that are in view. Here every element is
 * 400 pixels high, and scrolls where it is told to.
 */
Object.defineProperties(HTMLElement.prototype, {
  offsetHeight: { configurable: true, get: () => 400 },
  offsetWidth: { configurable: true, get: () => 800 },
  scrollHeight: { configurable: true, get: () => 1_000_000 },
  clientHeight: { configurable: true, get: () => 400 },
});
Element.prototype.scrollIntoView = () => undefined;
Element.prototype.scrollTo = function scrollTo(this: Element, to?: ScrollToOptions | number) {
  const top = typeof to === 'object' ? (to.top ?? 0) : 0;
  if (top === this.scrollTop) return;
  this.scrollTop = top;
  this.dispatchEvent(new Event('scroll'));
} as Element['scrollTo'];
