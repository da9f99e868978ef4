import { PageHeader } from '../ui/answer-header.tsx';

export function RebuildsPage() {
  return <PageHeader title="Rebuilds" />;
}
