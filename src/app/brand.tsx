import { Link } from 'react-router-dom';

/** The mark: two panels and the gap between them, chalked. The same drawing stands in index.html. */
export function Brand({ to = '/' }: { to?: string }) {
  return (
    <Link to={to} className="brand" aria-label="Panelgap: to the start">
      <svg className="brand-mark" viewBox="0 0 30 24" aria-hidden="true" focusable="false">
        <path d="M1 4.5 12.6 1v22L1 19.5Z" fill="currentColor" />
        <path d="M29 4.5 17.4 1v22L29 19.5Z" fill="currentColor" />
        <path className="brand-gap" d="M13.9.5h2.2v23h-2.2z" />
      </svg>
      Panelgap
    </Link>
  );
}
