import { Dialog as Base } from '@base-ui/react/dialog';
import { type ReactNode, useRef } from 'react';
import { PopupHome } from './popup-home.ts';

type Props = {
  open: boolean;
  onClose: () => void;
  title: string;
  /** One sentence under the title. */
  note?: ReactNode;
  children: ReactNode;
  /** Keeps it open on Escape and outside presses. */
  stay?: boolean;
};

/** A dialog over the page. `open`, `onClose`, `title`, `note`, `stay`. Put the buttons in a `DialogActions` at its end. */
export function Dialog({ open, onClose, title, note, children, stay = false }: Props) {
  const home = useRef<HTMLDivElement>(null);
  return (
    <Base.Root open={open} onOpenChange={(next) => !next && onClose()} disablePointerDismissal={stay}>
      <Base.Portal>
        <Base.Backdrop className="backdrop" />
        <Base.Popup ref={home} className="dialog">
          <Base.Title className="pr-10 text-lead font-bold">{title}</Base.Title>
          {note && <Base.Description className="mt-1 text-soft">{note}</Base.Description>}
          <PopupHome value={home}>
            <div className="mt-4 grid gap-4">{children}</div>
          </PopupHome>
          {!stay && (
            <Base.Close className="absolute top-3 right-3 grid size-11 place-items-center text-lead" aria-label="Close">
              ×
            </Base.Close>
          )}
        </Base.Popup>
      </Base.Portal>
    </Base.Root>
  );
}

/** The row of buttons at the end of a dialog or form: the main one first. */
export function DialogActions({ children }: { children: ReactNode }) {
  return <div className="mt-2 flex flex-wrap gap-3">{children}</div>;
}
