import { clockText, percentText } from './number-formats.ts';
import type { Attributes } from './xml-scanner.ts';

// What lies over the cells: its words are none of theirs.
const BESIDE = new Set(['annotation', 'frame', 'custom-shape', 'caption', 'rect', 'g']);
const ERROR = /^(?:#[A-Z\d/]+[!?]?|Err:\d+)$/;
const LONGEST_BLANK = 100;

/** One cell of an .ods sheet while it is read, and the comment on it. */
export class OdsCell {
  /** In how many columns side by side it stands. */
  readonly times: number;
  readonly formula: string | undefined;
  private readonly value: string | null;
  private text = '';
  private paragraphs = 0;
  private depth = 0;
  private noted: string[] | null = null;
  /** Who wrote a comment, and when: no part of it. */
  private isAside = false;

  constructor(attributes: Attributes) {
    this.times = timesOf(attributes.get('table:number-columns-repeated'));
    this.formula = attributes.get('table:formula');
    this.value = storedValue(attributes);
  }

  /** Its stored value, or what it shows; a formula without either as the formula. */
  get content(): string {
    // Some programs store 0 beside an error that they show.
    if (this.value !== null && !(this.text !== '' && ERROR.test(this.text))) return this.value;
    return this.isWithoutValue ? (this.formula ?? '').replace(/^\w+:=?/, '=').slice(0, 200) : this.text;
  }

  /** Is it a formula beside which nothing is stored? */
  get isWithoutValue(): boolean {
    return this.formula !== undefined && this.value === null && this.text === '' && this.paragraphs === 0;
  }

  /** The comment on it; '' = none. */
  get comment(): string {
    return this.noted?.join('\n').trim() ?? '';
  }

  open(name: string, attributes: Attributes): void {
    if (BESIDE.has(name)) {
      this.depth++;
      if (name === 'annotation') this.noted = [];
    } else if (name === 'p') this.openParagraph();
    else if (name === 's') this.hear(' '.repeat(Math.min(LONGEST_BLANK, timesOf(attributes.get('text:c')))));
    else if (name === 'tab') this.hear('\t');
    else if (name === 'line-break') this.hear('\n');
    else if (name === 'creator' || name === 'date') this.isAside = true;
  }

  close(name: string): void {
    if (BESIDE.has(name)) this.depth--;
    else if (name === 'creator' || name === 'date') this.isAside = false;
  }

  hear(piece: string): void {
    if (this.isAside) return;
    if (this.depth === 0) {
      if (this.paragraphs > 0) this.text += piece;
    } else if (this.noted && this.noted.length > 0) this.noted[this.noted.length - 1] += piece;
  }

  private openParagraph(): void {
    if (this.depth > 0) this.noted?.push('');
    else if (this.paragraphs++ > 0) this.text += '\n';
  }
}

/** How often something stands side by side. */
export const timesOf = (attribute: string | undefined) =>
  attribute === undefined ? 1 : Math.max(1, Math.min(1_048_576, Number(attribute) || 1));

/** The value that a cell stores beside what it shows; null = it stores none, and its text is the value. */
function storedValue(attributes: Attributes): string | null {
  switch (attributes.get('office:value-type') ?? '') {
    case 'float':
      return numberText(attributes);
    case 'currency': {
      const code = attributes.get('office:currency') ?? 'USD';
      const amount = numberText(attributes);
      return amount === null || code === 'USD' ? amount : `${code} ${amount}`;
    }
    case 'date':
      return attributes.get('office:date-value')?.slice(0, 10) ?? null;
    case 'percentage': {
      const share = Number(attributes.get('office:value'));
      return Number.isFinite(share) ? percentText(share) : null;
    }
    case 'time':
      return timeText(attributes.get('office:time-value') ?? '');
    case 'boolean':
      return attributes.get('office:boolean-value')?.toUpperCase() ?? null;
    default:
      return null;
  }
}

function numberText(attributes: Attributes): string | null {
  const stored = attributes.get('office:value') ?? '';
  // Short numbers carry no noise of binary fractions.
  if (stored.length > 0 && stored.length <= 12 && !/e/i.test(stored)) return stored;
  const value = Number(stored === '' ? Number.NaN : stored);
  return Number.isFinite(value) ? String(Number(value.toPrecision(14))) : null;
}

/** `PT03H30M00S` → `3:30`. */
function timeText(text: string): string | null {
  const parts = /^PT(\d+)H(\d+)M(\d+)/.exec(text);
  return parts ? clockText((Number(parts[1]) * 60 + Number(parts[2])) / 1440) : null;
}
