import { Link, useParams } from 'react-router-dom';
import type { RebuildRef } from '#shared/contracts/answers-parts.ts';

/** Addresses within the shop that is shown. */
export function useShopPath(): (path: string) => string {
  const { shopId = '' } = useParams();
  return (path) => `/s/${shopId}/${path}`;
}

/** Where one rebuild stands. */
export function useRebuildPath(): (id: string) => string {
  const path = useShopPath();
  return (id) => path(`rebuilds/${id}`);
}

/** Tag and name of a rebuild; leads to it. */
export function RebuildLink({ rebuild, short = false }: { rebuild: RebuildRef; short?: boolean }) {
  const path = useRebuildPath();
  return <Link to={path(rebuild.id)}>{short || !rebuild.name ? rebuild.tag : `${rebuild.tag} · ${rebuild.name}`}</Link>;
}
