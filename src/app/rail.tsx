import { NavLink } from 'react-router-dom';
import type { Session } from '#shared/contracts/session.ts';
import { Brand } from './brand.tsx';
import { GROUPS, placesOf, startOf } from './places.ts';
import { RailFoot } from './rail-foot.tsx';

/** The rail: the mark, the places of the role in their groups, and who is here. On a phone only the mark and the finder stay. */
export function Rail({ session, onFind }: { session: Session; onFind: () => void }) {
  const base = `/s/${session.shop.id}`;
  return (
    <header className="rail">
      <Brand to={`${base}/${startOf(session.role)}`} />
      <button type="button" onClick={onFind} className="rail-find" aria-keyshortcuts="Control+K Meta+K">
        Find <kbd className="rail-key">Ctrl K</kbd>
      </button>
      <nav aria-label="Places">
        <PlaceList session={session} />
      </nav>
      <RailFoot session={session} />
    </header>
  );
}

/** The places as grouped links; the phone's menu shows the same. */
export function PlaceList({ session, onPick }: { session: Session; onPick?: () => void }) {
  const places = placesOf(session.role);
  return GROUPS.map((group) => {
    const inGroup = places.filter((place) => place.group === group);
    if (inGroup.length === 0) return null;
    return (
      <section key={group} className="rail-group" aria-label={group}>
        <div className="rail-title" aria-hidden="true">
          {group}
        </div>
        <ul>
          {inGroup.map((place) => (
            <li key={place.path}>
              <NavLink to={`/s/${session.shop.id}/${place.path}`} className="rail-link" onClick={() => onPick?.()}>
                {place.label}
              </NavLink>
            </li>
          ))}
        </ul>
      </section>
    );
  });
}
