import { type MouseEvent, useRef } from 'react';
import type { Category, ListItem, ListKind } from '#shared/contracts/shop.ts';
import { Button } from '../../ui/button.tsx';
import { ConflictDialog } from '../../ui/conflict.tsx';
import { AddWord } from './add-word.tsx';
import { conflictFields } from './conflict-fields.ts';
import { useAddItem, useItemEdit } from './mutations.ts';
import { useListActs } from './use-list-acts.ts';
import { WordRow } from './word-row.tsx';
import { WordsFrame } from './words-frame.tsx';

type Props = {
  kind: ListKind;
  title: string;
  subtitle: string;
  addLabel: string;
  items: readonly (ListItem | Category)[];
  canEdit: boolean;
};

/** Classes, damage types or categories: added, renamed, moved, retired and brought back; never deleted. */
export function WordsPanel({ kind, title, subtitle, addLabel, items, canEdit }: Props) {
  const { edit, conflict, dismiss } = useItemEdit(kind);
  const { save, act } = useListActs({ edit });
  const add = useAddItem(kind);
  const list = useRef<HTMLUListElement>(null);
  const inUse = items.filter((item) => !item.isRetired);
  const onRename = (item: ListItem) => (name: string) =>
    save(item, { name }, { said: `${item.name} is now ${name}`, back: { name: item.name } });
  const onRetire = async (item: ListItem) => {
    await act(item, { isRetired: true }, { said: `${item.name} retired`, back: { isRetired: false } });
    list.current?.focus();
  };
  const onBringBack = (item: ListItem) =>
    act(item, { isRetired: false }, { said: `${item.name} is offered again`, back: { isRetired: true } });
  const onMove = async (item: ListItem, to: ListItem | undefined, event: MouseEvent<HTMLButtonElement>) => {
    const button = event.currentTarget;
    if (!to) return;
    const back = { position: item.position };
    await act(item, { position: to.position }, { said: `${item.name} moved`, back });
    // A moved row loses the focus in some browsers; the next press shall move it on.
    button.focus();
  };
  return (
    <WordsFrame
      {...{ title, subtitle, items }}
      listRef={list}
      empty="None in use: forms offer nothing to choose here."
      row={(item: ListItem | Category, at) => (
        <WordRow
          key={item.id}
          name={item.name}
          note={isPaidLabor(item) && 'Wages for hours on a rebuild'}
          onRename={canEdit ? onRename(item) : undefined}
          acts={
            canEdit && (
              <>
                <MoveButton
                  words={`Move ${item.name} up`}
                  sign="↑"
                  isEnd={at === 0}
                  onPress={(e) => void onMove(item, inUse[at - 1], e)}
                />
                <MoveButton
                  words={`Move ${item.name} down`}
                  sign="↓"
                  isEnd={at === inUse.length - 1}
                  onPress={(e) => void onMove(item, inUse[at + 1], e)}
                />
                <Button
                  kind="plain"
                  size="small"
                  aria-label={`Retire ${item.name}`}
                  onClick={() => void onRetire(item)}
                >
                  Retire
                </Button>
              </>
            )
          }
        />
      )}
      retiredRow={(item: ListItem) => (
        <WordRow
          key={item.id}
          name={item.name}
          acts={
            canEdit && (
              <Button
                kind="plain"
                size="small"
                aria-label={`Bring ${item.name} back`}
                onClick={() => void onBringBack(item)}
              >
                Bring back
              </Button>
            )
          }
        />
      )}
    >
      {canEdit && <AddWord label={addLabel} onAdd={add} />}
      {conflict && (
        <ConflictDialog
          subject={conflict.theirs.name}
          fields={conflictFields(conflict.mine, conflict.theirs)}
          onMine={() => void act(conflict.theirs, conflict.mine, { said: `Yours stands on ${conflict.theirs.name}` })}
          onTheirs={dismiss}
        />
      )}
    </WordsFrame>
  );
}

function isPaidLabor(item: ListItem | Category): boolean {
  return 'isPaidLabor' in item && item.isPaidLabor;
}

type MoveProps = {
  words: string;
  sign: string;
  isEnd: boolean;
  onPress: (event: MouseEvent<HTMLButtonElement>) => void;
};

/** Stays in the tab order at the list's end, so that the focus is not lost there. */
function MoveButton({ words, sign, isEnd, onPress }: MoveProps) {
  return (
    <Button
      kind="plain"
      size="small"
      aria-label={words}
      aria-disabled={isEnd || undefined}
      onClick={onPress}
      className="min-w-8 border-transparent px-2 text-soft"
    >
      {sign}
    </Button>
  );
}
