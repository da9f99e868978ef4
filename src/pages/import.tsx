import { PageHeader } from '../ui/answer-header.tsx';

export function ImportPage() {
  return <PageHeader title="Import" />;
}
