import { PageHeader } from '../ui/answer-header.tsx';

export function TimeToSellPage() {
  return <PageHeader title="How long until the money is back?" />;
}
