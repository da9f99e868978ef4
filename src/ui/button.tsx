import type { ComponentProps } from 'react';
import { Link } from 'react-router-dom';

type Look = { kind?: 'main' | 'quiet' | 'danger' | 'plain'; size?: 'small' | 'normal' | 'large' };

/**
 * A button. `kind`: main (the one act of the page), quiet (default), danger, plain. `size`: small, normal, large.
 * `busy` shows that it works and takes no second press. All props of a button besides; its type is "button" unless said.
 */
export function Button({
  kind,
  size,
  busy = false,
  className,
  children,
  ...rest
}: ComponentProps<'button'> & Look & { busy?: boolean }) {
  return (
    <button
      type="button"
      {...rest}
      className={`${looks({ ...(kind && { kind }), ...(size && { size }) })} ${className ?? ''}`}
      aria-busy={busy || undefined}
      disabled={rest.disabled || busy}
    >
      {children}
      {busy && <span aria-hidden="true">…</span>}
    </button>
  );
}

/** A link that looks like a button. Props of a router link, and `kind`, `size` as above. */
export function LinkButton({ kind, size, className, ...rest }: ComponentProps<typeof Link> & Look) {
  return <Link {...rest} className={`${looks({ ...(kind && { kind }), ...(size && { size }) })} ${className ?? ''}`} />;
}

function looks({ kind = 'quiet', size = 'normal' }: Look): string {
  return `button button-${kind} button-${size}`;
}
