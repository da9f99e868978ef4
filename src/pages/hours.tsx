import { PageHeader } from '../ui/answer-header.tsx';

export function HoursPage() {
  return <PageHeader title="Hours" />;
}
