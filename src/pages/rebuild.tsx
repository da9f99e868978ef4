import { PageHeader } from '../ui/answer-header.tsx';

export function RebuildPage() {
  return <PageHeader title="Rebuild" />;
}
