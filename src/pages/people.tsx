import { PageHeader } from '../ui/answer-header.tsx';

export function PeoplePage() {
  return <PageHeader title="People" />;
}
