import { useState } from 'react';
import { NavLink } from 'react-router-dom';
import type { Session } from '#shared/contracts/session.ts';
import { Dialog } from '../ui/dialog.tsx';
import { mostUsedOf } from './places.ts';
import { PlaceList } from './rail.tsx';
import { RailFoot } from './rail-foot.tsx';

/** The rail of a phone: the four most used and a menu with everything. */
export function BottomBar({ session }: { session: Session }) {
  const [isOpen, setOpen] = useState(false);
  const close = () => setOpen(false);
  return (
    <>
      <nav aria-label="Most used" className="bottom-bar">
        {mostUsedOf(session.role).map((place) => (
          <NavLink key={place.path} to={`/s/${session.shop.id}/${place.path}`} className="bottom-link">
            {place.label}
          </NavLink>
        ))}
        <button type="button" className="bottom-link" aria-haspopup="dialog" onClick={() => setOpen(true)}>
          Menu
        </button>
      </nav>
      <Dialog open={isOpen} onClose={close} title={session.shop.name}>
        <nav aria-label="All places" className="menu-places">
          <PlaceList session={session} onPick={close} />
        </nav>
        <RailFoot session={session} className="grid gap-2 border-t border-rule pt-4" />
      </Dialog>
    </>
  );
}
