import { Autocomplete } from '@base-ui/react/autocomplete';
import { Dialog } from '@base-ui/react/dialog';
import { useQueries } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import type { Session } from '#shared/contracts/session.ts';
import { leaveBy } from '../lib/unsaved.ts';
import { signOut } from '../lib/session.ts';
import { placesOf } from './places.ts';
import { type PaletteItem, paletteSources } from './palette-sources.ts';

/** Finds any rebuild, page or action by typing a piece of its name. */
export function Palette({ session, onClose }: { session: Session; onClose: () => void }) {
  const navigate = useNavigate();
  const items = usePaletteItems(session);
  const onPick = (item: PaletteItem) => {
    onClose();
    const { to } = item;
    if (to) leaveBy(() => void navigate(to));
    item.run?.();
  };
  return (
    <Dialog.Root open onOpenChange={(open) => !open && onClose()}>
      <Dialog.Portal>
        <Dialog.Backdrop className="backdrop" />
        <Dialog.Popup className="dialog palette" aria-label="Find">
          <Autocomplete.Root
            open
            inline
            items={items}
            autoHighlight="always"
            keepHighlight
            itemToStringValue={(item: PaletteItem) => `${item.label} ${item.note}`}
          >
            <Autocomplete.Input
              aria-label="Find a rebuild, a page or an action"
              placeholder="Find a rebuild, a page or an action"
              className="palette-input"
            />
            <Autocomplete.Empty>
              <div className="px-4 py-3 text-soft">Nothing of that name</div>
            </Autocomplete.Empty>
            <Autocomplete.List className="max-h-[22rem] overflow-y-auto">
              {(item: PaletteItem) => (
                <Autocomplete.Item key={item.id} value={item} className="popup-item px-4" onClick={() => onPick(item)}>
                  <span>{item.label}</span>
                  <span className="popup-note">{item.note}</span>
                </Autocomplete.Item>
              )}
            </Autocomplete.List>
          </Autocomplete.Root>
        </Dialog.Popup>
      </Dialog.Portal>
    </Dialog.Root>
  );
}

function usePaletteItems(session: Session): PaletteItem[] {
  const sources = paletteSources.filter((source) => source.roles.includes(session.role));
  const found = useQueries({
    queries: sources.map((source) => ({
      queryKey: ['palette', source.key, session.shop.id],
      queryFn: () => source.load(session.shop.id),
    })),
  });
  const places = placesOf(session.role).map((place) => ({
    id: place.path,
    label: place.label,
    note: place.group,
    to: `/s/${session.shop.id}/${place.path}`,
  }));
  const leave: PaletteItem = {
    id: 'sign-out',
    label: 'Sign out',
    note: 'Action',
    run: () => void signOut().finally(() => location.assign('/sign-in')),
  };
  return [...places, ...found.flatMap((query) => query.data ?? []), leave];
}
