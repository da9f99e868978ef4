/** Attributes of an element; good only while it is being heard. */
export interface Attributes {
  /** Its value by its name; a name without a prefix finds it under any. */
  get(name: string): string | undefined;
}

/** Hears the elements of an XML document by their names without prefix. */
export interface XmlHearer {
  open(name: string, attributes: Attributes): void;
  close?(name: string): void;
  text?(text: string): void;
}

/** What is wrong with a document; whoever scans says it in words for people. */
export class XmlFault extends Error {
  readonly kind: 'malformed' | 'document type' | 'too long';

  constructor(kind: XmlFault['kind'] = 'malformed') {
    super(`XML: ${kind}`);
    this.kind = kind;
  }
}

const DEEPEST = 200;
// What one tag, text or comment may hold before it is no longer waited for its end.
const LONGEST = 2 * 1024 * 1024;
const [BANG, DOUBLE, SINGLE, SLASH, COLON, EQUALS, GREATER, QUESTION] = [33, 34, 39, 47, 58, 61, 62, 63];
const ENTITIES: Readonly<Record<string, string>> = { lt: '<', gt: '>', amp: '&', quot: '"', apos: "'" };

/**
 * Goes through XML that comes piece by piece, and keeps none of it: elements, their attributes and texts, CDATA.
 * Comments and instructions are passed over. No document type, so no entities but the five and characters by number.
 * Throws an XmlFault where elements are not closed in order, or where something else is malformed.
 */
export class XmlScanner {
  private readonly hearer: XmlHearer;
  private readonly attributes = new TagAttributes();
  private readonly names: string[] = [];
  private readonly locals: string[] = [];
  /** What came and has not been heard yet. */
  private source = '';
  private isBegun = false;

  constructor(hearer: XmlHearer) {
    this.hearer = hearer;
  }

  write(piece: string): void {
    this.source += piece;
    const { source } = this;
    let at = 0;
    for (;;) {
      const from = source.indexOf('<', at);
      if (from < 0) break;
      if (from > at) this.text(unescaped(source.slice(at, from)));
      at = from;
      const end = this.markup(from);
      if (end < 0) break;
      at = end;
    }
    this.source = source.slice(at);
    if (this.source.length > LONGEST) throw new XmlFault('too long');
  }

  /** Says that nothing follows. */
  end(): void {
    if (this.names.length > 0 || !this.isBegun || this.source.trim() !== '') throw new XmlFault();
  }

  /** Takes what begins at `<`. Gives where it ends; −1 = not in what came so far. */
  private markup(from: number): number {
    const code = this.source.charCodeAt(from + 1);
    if (code === SLASH) return this.closeTag(from);
    if (code === BANG) return this.declaration(from);
    if (code === QUESTION) return this.after('?>', from);
    return this.openTag(from);
  }

  private openTag(from: number): number {
    const { source, names, hearer } = this;
    const nameEnd = endOfName(source, from + 1);
    const end = this.attributes.read(source, nameEnd);
    if (end < 0) return -1;
    if (nameEnd === from + 1 || names.length === DEEPEST || (names.length === 0 && this.isBegun)) throw new XmlFault();
    this.isBegun = true;
    const name = source.slice(from + 1, nameEnd);
    const local = name.length === 1 ? name : name.slice(name.indexOf(':') + 1);
    hearer.open(local, this.attributes);
    if (source.charCodeAt(end - 2) === SLASH) hearer.close?.(local);
    else {
      names.push(name);
      this.locals.push(local);
    }
    return end;
  }

  private closeTag(from: number): number {
    const { source } = this;
    const name = this.names.at(-1);
    const end = afterSpace(source, from + 2 + (name?.length ?? 0));
    if (name === undefined || !source.startsWith(name, from + 2) || source.charCodeAt(end) !== GREATER) {
      if (!source.includes('>', from)) return -1;
      throw new XmlFault();
    }
    this.names.pop();
    this.hearer.close?.(this.locals.pop() as string);
    return end + 1;
  }

  private declaration(from: number): number {
    const { source } = this;
    if (source.startsWith('<!--', from)) return this.after('-->', from + 4);
    if (source.startsWith('<![CDATA[', from)) {
      const end = this.after(']]>', from + 9);
      if (end >= 0) this.text(source.slice(from + 9, end - 3));
      return end;
    }
    if (source.length - from < 9) return -1;
    throw new XmlFault('document type');
  }

  private after(mark: string, from: number): number {
    const at = this.source.indexOf(mark, from);
    return at < 0 ? -1 : at + mark.length;
  }

  private text(piece: string): void {
    if (this.names.length > 0) this.hearer.text?.(piece);
    else if (piece.trim() !== '') throw new XmlFault();
  }
}

/** The attributes of one tag after another, by their places in the source: most are never asked for. */
class TagAttributes implements Attributes {
  private source = '';
  /** Of each: where its name begins and ends, and its value. */
  private readonly places: number[] = [];
  private count = 0;

  /** Reads up to the end of a tag. Gives where that is; −1 = not in what came so far. */
  read(source: string, start: number): number {
    this.source = source;
    this.count = 0;
    let at = start;
    for (;;) {
      at = afterSpace(source, at);
      const code = source.charCodeAt(at);
      if (code === GREATER) return at + 1;
      if (code === SLASH && source.charCodeAt(at + 1) === GREATER) return at + 2;
      at = this.one(at);
      if (at < 0) return -1;
    }
  }

  get(name: string): string | undefined {
    const { source, places, count } = this;
    for (let i = 0; i < count; i += 4) {
      const begin = places[i] as number;
      const from = (places[i + 1] as number) - name.length;
      const isWhole = from === begin || (from > begin && source.charCodeAt(from - 1) === COLON);
      if (isWhole && source.startsWith(name, from)) return unescaped(source.slice(places[i + 2], places[i + 3]));
    }
    return undefined;
  }

  /** Keeps the places of the attribute that begins here. Gives where it ends; −1 = not in what came so far. */
  private one(from: number): number {
    const { source, places, count } = this;
    const nameEnd = endOfName(source, from);
    const equals = afterSpace(source, nameEnd);
    const mark = afterSpace(source, equals + 1);
    if (mark >= source.length) return -1;
    const quote = source.charCodeAt(mark);
    const isSound = nameEnd > from && source.charCodeAt(equals) === EQUALS && (quote === DOUBLE || quote === SINGLE);
    if (!isSound) throw new XmlFault();
    const end = source.indexOf(quote === DOUBLE ? '"' : "'", mark + 1);
    places[count] = from;
    places[count + 1] = nameEnd;
    places[count + 2] = mark + 1;
    places[count + 3] = end;
    this.count = count + 4;
    return end < 0 ? -1 : end + 1;
  }
}

const isSpace = (code: number) => code === 32 || code === 10 || code === 9 || code === 13;

function afterSpace(text: string, start: number): number {
  let at = start;
  while (isSpace(text.charCodeAt(at))) at++;
  return at;
}

function endOfName(text: string, start: number): number {
  let at = start;
  for (;;) {
    const code = text.charCodeAt(at);
    // Letters, digits, `-`, `.`, `:`, `_` and everything beyond ASCII; not a number (the end) is none of them.
    const isName = (code >= 97 && code <= 122) || (code >= 45 && code <= 58 && code !== SLASH) || isRareInNames(code);
    if (!isName) return at;
    at++;
  }
}

const isRareInNames = (code: number) => (code >= 65 && code <= 90) || code === 95 || code > 127;

function unescaped(text: string): string {
  return text.includes('&') ? text.replace(/&([^;&]{0,12});?/g, (whole, name: string) => character(whole, name)) : text;
}

function character(whole: string, name: string): string {
  if (!whole.endsWith(';')) throw new XmlFault();
  if (!name.startsWith('#')) {
    const known = ENTITIES[name];
    if (known === undefined) throw new XmlFault();
    return known;
  }
  const code = Number(name.startsWith('#x') ? `0${name.slice(1)}` : name.slice(1));
  const isAllowed = code === 9 || code === 10 || code === 13 || (code >= 32 && code <= 0x10ffff);
  if (!isAllowed || (code >= 0xd800 && code <= 0xdfff)) throw new XmlFault();
  return String.fromCodePoint(code);
}
