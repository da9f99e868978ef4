import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { Session } from '#shared/contracts/session.ts';
import { forgetPerson, keptNames } from '../lib/kept.ts';
import { leaveBy } from '../lib/unsaved.ts';
import { signOut } from '../lib/session.ts';
import { ConfirmDialog } from '../ui/confirm-dialog.tsx';
import { Menu } from '../ui/menu.tsx';
import { SCHEMES, useScheme } from './scheme.ts';

/** Which shop, who, and the few things that belong to the person: light or dark, sign out. */
export function RailFoot({ session, className = 'rail-foot' }: { session: Session; className?: string }) {
  const navigate = useNavigate();
  const [scheme, setScheme] = useScheme();
  const others = session.shops.filter((shop) => shop.id !== session.shop.id);
  const [isAsking, setAsking] = useState(false);
  const { id } = session.user;
  const isWaiting = () => keptNames(`${id}.`).some((name) => name.endsWith('.waiting'));
  const onSignOut = () =>
    signOut().finally(() => {
      forgetPerson(id);
      location.assign('/sign-in');
    });
  return (
    <div className={className}>
      <div>
        <div className="font-[640]">{session.shop.name}</div>
        <div className="text-label text-soft">
          {session.user.name}, {session.role}
        </div>
      </div>
      <div className="flex flex-wrap gap-x-4 gap-y-1 text-label">
        {others.length > 0 && (
          <Menu
            label="Other shop"
            plain
            items={others.map((shop) => ({
              label: shop.name,
              note: shop.role,
              onSelect: () => leaveBy(() => void navigate(`/s/${shop.id}`)),
            }))}
          />
        )}
        <Menu
          label={SCHEMES.find((one) => one.value === scheme)?.label ?? ''}
          plain
          items={SCHEMES.map((one) => ({ label: one.label, onSelect: () => setScheme(one.value) }))}
        />
        <button type="button" className="rail-act" onClick={() => (isWaiting() ? setAsking(true) : void onSignOut())}>
          Sign out
        </button>
      </div>
      {isAsking && (
        <ConfirmDialog
          title="Sign out before it is sent?"
          note="A pre-bid sheet waits in this browser for a signal. When you sign out, it is gone."
          act="Sign out all the same"
          isDanger
          onAct={onSignOut}
          onClose={() => setAsking(false)}
        />
      )}
    </div>
  );
}
