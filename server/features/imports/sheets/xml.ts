import { SaxesParser, type SaxesTagPlain } from 'saxes';
import { FileRefusal } from '../refusal.ts';
import { damaged, type Zip } from './zip.ts';

/** Hears the elements of an XML document by their names without prefix. */
export interface XmlHearer {
  open(name: string, attributes: Readonly<Record<string, string>>): void;
  close?(name: string): void;
  text?(text: string): void;
}

const bare = (name: string) => name.slice(name.indexOf(':') + 1);

/**
 * Goes through a part of an archive that is XML, piece by piece; false = there is no such part. No DTD, no entities
 * but the five; throws a FileRefusal for bad XML.
 */
export function readXml(zip: Zip, part: string, hearer: XmlHearer): boolean {
  const parser = new SaxesParser({ position: false });
  parser.on('error', () => {
    throw damaged();
  });
  parser.on('doctype', () => {
    throw new FileRefusal(
      'damaged',
      'This workbook carries a document type definition; no spreadsheet program writes one.',
    );
  });
  parser.on('opentag', (tag) => hearer.open(bare(tag.name), (tag as SaxesTagPlain).attributes));
  if (hearer.close) parser.on('closetag', (tag) => hearer.close?.(bare(tag.name)));
  if (hearer.text) parser.on('text', (text) => hearer.text?.(text));
  let decoder: TextDecoder | null = null;
  const isThere = zip.read(part, (piece) => {
    decoder ??= new TextDecoder(piece[0] === 0xff && piece[1] === 0xfe ? 'utf-16le' : 'utf-8');
    parser.write(decoder.decode(piece, { stream: true }));
  });
  if (isThere) parser.close();
  return isThere;
}
