import { PageHeader } from '../ui/answer-header.tsx';

export function ContingencyPage() {
  return <PageHeader title="How much cushion should next year's budgets carry?" />;
}
