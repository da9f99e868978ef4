import { Menu as Base } from '@base-ui/react/menu';
import type { ReactNode } from 'react';
import { usePopupHome } from './popup-home.ts';

export type MenuItem = { label: string; note?: string; onSelect: () => void; disabled?: boolean };

/** A button that drops a menu. `label` is the button's content, `items` (label, note, onSelect); `plain` makes it look like a link. */
export function Menu({
  label,
  items,
  plain = false,
}: {
  label: ReactNode;
  items: readonly MenuItem[];
  plain?: boolean;
}) {
  const home = usePopupHome();
  return (
    <Base.Root>
      <Base.Trigger className={plain ? 'rail-act' : 'button button-small'}>
        {label} <span aria-hidden="true">▾</span>
      </Base.Trigger>
      <Base.Portal container={home}>
        <Base.Positioner sideOffset={4} positionMethod="fixed" align="start" className="z-40">
          <Base.Popup className="popup">
            {items.map((item) => (
              <Base.Item
                key={item.label}
                className="popup-item"
                disabled={item.disabled ?? false}
                onClick={item.onSelect}
              >
                <span>{item.label}</span>
                {item.note && <span className="popup-note">{item.note}</span>}
              </Base.Item>
            ))}
          </Base.Popup>
        </Base.Positioner>
      </Base.Portal>
    </Base.Root>
  );
}
