import { countInWords, type Formatter } from '#shared/formatter.ts';

/** A figure that the answer rests on: chalk goes under it. */
export type Marked = { readonly mark: string };
export type Part = string | Marked;
export type Sentence = readonly Part[];

/** An answer and what a careful friend would add, one sentence each. */
export type Said = { readonly answer: Sentence; readonly cautions: readonly string[] };

export const mark = (text: string): Marked => ({ mark: text });

/** A sentence whose marked figures stay apart from its words: say`They kept ${mark('$9')}.` */
export function say(words: TemplateStringsArray, ...values: readonly (Part | Sentence)[]): Sentence {
  return words.flatMap((text, at) => {
    const value = values[at];
    const said: readonly Part[] = value === undefined ? [] : Array.isArray(value) ? value : [value as Part];
    return text === '' ? said : [text, ...said];
  });
}

/** The sentence without its marks. */
export function plain(sentence: Sentence): string {
  return sentence.map((part) => (typeof part === 'string' ? part : part.mark)).join('');
}

/** `one rebuild`, `twelve rebuilds`, `13 rebuilds`. */
export function counted(format: Formatter, count: number, one = 'rebuild', many = `${one}s`): string {
  return `${words(format, count)} ${count === 1 ? one : many}`;
}

export function words(format: Formatter, count: number): string {
  return countInWords(count, { locale: format.style.locale });
}

/** `one is`, `three are`. */
export function areCounted(format: Formatter, count: number): string {
  return `${words(format, count)} ${count === 1 ? 'is' : 'are'}`;
}

/** `a`, `a and b`, `a, b and c`. */
export function listed(parts: readonly string[]): string {
  if (parts.length < 2) return parts.join('');
  return `${parts.slice(0, -1).join(', ')} and ${parts.at(-1)}`;
}

/** Everything that is not null, false or empty. */
export function said(...parts: readonly (string | null | false | undefined)[]): string[] {
  return parts.filter((part): part is string => typeof part === 'string' && part !== '');
}

/** Below this many a figure is given and marked, and never ranked (definitions §0). */
export const ENOUGH = 5;
