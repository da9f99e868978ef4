import type { HintKeeper } from './hints.ts';
import type { Relation } from './xlsx-relations.ts';
import { placeOf } from './xlsx-rows.ts';
import { readXml } from './xml.ts';
import type { Zip } from './zip.ts';

/**
 * Reads the comments on a sheet's cells, those of both kinds. A talk of several has a comment of the older kind as its
 * stand-in, which only says so.
 */
export function readComments(zip: Zip, relations: readonly Relation[], beside: HintKeeper): void {
  const talks = new Map<string, string[]>();
  const read = (kind: string, element: string, take: (place: string, text: string) => void) => {
    for (const { target } of relations.filter((one) => one.kind === kind && !one.isOutside)) {
      readXml(zip, target, commentHearer(element, take));
    }
  };
  read('threadedComment', 'threadedComment', (place, text) => {
    talks.set(place, [...(talks.get(place) ?? []), text]);
  });
  read('comments', 'comment', (place, text) => {
    if (!talks.has(place)) talks.set(place, [text]);
  });
  for (const [place, texts] of talks) {
    const { row, col } = placeOf(place);
    const text = texts.join('\n').trim();
    if (row > 0 && col > 0 && text !== '') beside.comment(row, col, text);
  }
}

function commentHearer(element: string, take: (place: string, text: string) => void) {
  let place = '';
  let text = '';
  let isText = false;
  return {
    open(name: string, attributes: { get(name: string): string | undefined }) {
      if (name === element) {
        place = attributes.get('ref') ?? '';
        text = '';
      }
      // The newer kind holds its text as such, the older one in runs.
      isText = name === 't' || (name === 'text' && element === 'threadedComment');
    },
    close(name: string) {
      isText = false;
      if (name === element) take(place, text);
    },
    text(piece: string) {
      if (isText) text += piece;
    },
  };
}
