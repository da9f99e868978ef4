import { useState } from 'react';
import { useUnsaved } from '../../../lib/unsaved.ts';
import { Button } from '../../../ui/button.tsx';
import { Dialog, DialogActions } from '../../../ui/dialog.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { TextAreaField } from '../../../ui/text-field.tsx';
import { pastedFile, sizeOf } from './pasted.ts';

type Props = { start: string; onFile: (file: File) => void; onClose: () => void };

/** Cells copied out of a spreadsheet: they are shown with their size, and come in as a file of their own. */
export function PasteDialog({ start, onFile, onClose }: Props) {
  const [text, setText] = useState(start);
  const format = useFormatter();
  const { rows, cells } = sizeOf(text);
  useUnsaved(rows > 0);
  const onTake = () => {
    onFile(pastedFile(text));
    onClose();
  };
  return (
    <Dialog
      open
      onClose={onClose}
      title="Paste cells"
      note="Copy the cells in your spreadsheet, with their headings, and paste them here."
    >
      <TextAreaField
        label="Cells"
        rows={8}
        value={text}
        spellCheck={false}
        wrap="off"
        onChange={(event) => setText(event.target.value)}
        hint={
          rows === 0
            ? 'Nothing here yet.'
            : `${format.count(rows, 'row')} of ${cells === 1 ? 'one cell' : `up to ${format.number(cells)} cells`}.`
        }
      />
      <DialogActions>
        <Button kind="main" disabled={rows === 0} onClick={onTake}>
          Bring these cells in
        </Button>
        <Button onClick={onClose}>Leave it</Button>
      </DialogActions>
    </Dialog>
  );
}
