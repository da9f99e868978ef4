import { PageHeader } from '../ui/answer-header.tsx';

export function YearPage() {
  return <PageHeader title="Did the work pay this year?" />;
}
