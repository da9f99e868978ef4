import { FileRefusal } from '../refusal.ts';

const ANEW = 'Open it in a spreadsheet program, save it as .xlsx or CSV, and bring that in.';
const PICTURE = 'This is a picture, whatever its name says. Workbooks and spreadsheets saved as text can be read.';
const PACKED = 'This is a compressed file. Unpack it first, then bring in the spreadsheet inside.';
const OLD = 'd0cf11e0';
const SIGNATURES: readonly (readonly [start: string, message: string])[] = [
  ['25504446', 'This is a PDF. Workbooks and spreadsheets saved as text can be read.'],
  ['89504e47', PICTURE],
  ['ffd8ff', PICTURE],
  ['47494638', PICTURE],
  ['49492a00', PICTURE],
  ['4d4d002a', PICTURE],
  ['52494646', PICTURE],
  ['1f8b', PACKED],
  ['377abcaf', PACKED],
  ['52617221', PACKED],
  ['fd377a58', PACKED],
  ['53514c69', `This is a database, no spreadsheet. ${ANEW}`],
  ['7b5c727466', 'This is a text document, no spreadsheet.'],
];
// Old programs save such files under the ending .xls.
const MARKUP = /^\s*(?:<!--[\s\S]*?-->\s*)*<(?:!doctype html|html|head|meta|body|table|div|style)\b/i;
const XML = /^\s*<(?:\?xml|workbook)\b/i;

/** Throws a FileRefusal when a file's first bytes are those of a picture, an archive, a web page …, or there are none. */
export function refuseNotText(head: Buffer): void {
  if (head.length === 0) throw new FileRefusal('empty', 'The file is empty.');
  const start = head.toString('hex', 0, 8);
  if (start.startsWith(OLD)) refuseOld(head);
  const known = SIGNATURES.find(([signature]) => start.startsWith(signature));
  if (known) throw new FileRefusal('not-text', known[1]);
  if (head.toString('latin1', 4, 8) === 'ftyp') throw new FileRefusal('not-text', PICTURE);
  const text = head
    .toString('latin1', 0, 2048)
    .replace(/^(?:\u00ef\u00bb\u00bf|\u00ff\u00fe|\u00fe\u00ff)/, '')
    .replaceAll('\0', '');
  if (MARKUP.test(text)) throw new FileRefusal('not-text', `This is a web page, whatever its name says. ${ANEW}`);
  if (XML.test(text)) throw new FileRefusal('not-text', `This is an XML file. ${ANEW}`);
}

/** The container of the old kind holds a workbook, or a new one behind a password; its parts are named in UTF-16. */
function refuseOld(head: Buffer): never {
  const holds = (name: string) => head.includes(Buffer.from(name, 'utf16le'));
  if (holds('EncryptedPackage')) {
    throw new FileRefusal(
      'locked',
      'This workbook is protected by a password. Open it, save a copy without one, and bring that in.',
    );
  }
  if (holds('Workbook') || holds('Book')) {
    throw new FileRefusal(
      'not-text',
      'This is a workbook of the old kind (.xls). Open it, save it as .xlsx, and bring that in.',
    );
  }
  throw new FileRefusal(
    'not-text',
    'This is a workbook of the old kind (.xls), or one protected by a password. Open it, save it as .xlsx without a password, and bring that in.',
  );
}
