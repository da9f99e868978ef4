import path from 'node:path';
import { readXml } from './xml.ts';
import type { Zip } from './zip.ts';

/** What one part of a workbook says of another. */
export interface Relation {
  readonly id: string;
  /** The last word of its type, such as `worksheet`: the two families of .xlsx differ in what stands before. */
  readonly kind: string;
  /** The part's place in the archive; outside of it, whatever the workbook says. */
  readonly target: string;
  readonly isOutside: boolean;
}

/** The relations of a part of a workbook; '' = those of the workbook itself. None where it lists none. */
export function relationsOf(zip: Zip, part: string): Relation[] {
  const folder = path.posix.dirname(part);
  const relations: Relation[] = [];
  readXml(zip, path.posix.join(folder, '_rels', `${path.posix.basename(part)}.rels`), {
    open(name, attributes) {
      if (name !== 'Relationship') return;
      const target = attributes.get('Target') ?? '';
      const isOutside = attributes.get('TargetMode') === 'External';
      relations.push({
        id: attributes.get('Id') ?? '',
        kind: (attributes.get('Type') ?? '').split('/').at(-1) ?? '',
        target: isOutside ? target : placeOf(folder, target),
        isOutside,
      });
    },
  });
  return relations;
}

/** Where a target stands in the archive; names with `..` lead nowhere outside it, since nothing is ever unpacked to disk. */
const placeOf = (folder: string, target: string) =>
  target.startsWith('/') ? target.slice(1) : path.posix.join(folder, target);

/** Where the workbook's own part stands; null = the archive is none of .xlsx. */
export function bookPart(zip: Zip): string | null {
  const known = 'xl/workbook.xml';
  if (zip.has(known)) return known;
  const [named] = zip.has('[content_types].xml')
    ? relationsOf(zip, '').filter(({ kind, target }) => kind === 'officeDocument' && zip.has(target))
    : [];
  return named && /^xl\/.*\.xml$/i.test(named.target) ? named.target : null;
}
