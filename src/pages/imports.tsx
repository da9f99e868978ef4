import { PageHeader } from '../ui/answer-header.tsx';

export function ImportsPage() {
  return <PageHeader title="Import" />;
}
