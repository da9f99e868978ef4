import { PageHeader } from '../ui/answer-header.tsx';

export function ShopPage() {
  return <PageHeader title="Shop" />;
}
