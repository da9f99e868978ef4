/** The text with a capital first letter: a word of the shop's lists at the start of a cell, an option or a sentence. */
export function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
