const MOST_FILES = 20;

/** What can be told of a file without reading it: why it cannot come in; null = nothing against it. */
export function faultOf(file: File): string | null {
  if (file.size === 0) return 'It is empty.';
  if (/^(image|video|audio)\//.test(file.type)) return 'It is a picture or a recording, not a spreadsheet.';
  if (file.type === 'application/pdf')
    return 'A PDF holds no cells. Bring in the spreadsheet that it was printed from.';
  return null;
}

/** Files with what is against each. More than the server takes at once is said of those that are too many. */
export function faultsOf(files: readonly File[]): { file: File; fault: string | null }[] {
  return files.map((file, at) => ({
    file,
    fault: at < MOST_FILES ? faultOf(file) : `Only ${MOST_FILES} files come in at once. Bring this one in afterwards.`,
  }));
}
