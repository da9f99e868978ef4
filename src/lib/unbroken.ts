/** The text with its minus signs tied to the amounts that they belong to, so that no line ends between the two. */
export function unbroken(text: string): string {
  return text.replace(/−(?=\p{Sc})/gu, '−\u2060');
}
