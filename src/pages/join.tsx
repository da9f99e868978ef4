import { PageHeader } from '../ui/answer-header.tsx';

export function JoinPage() {
  return <PageHeader title="Join a shop" />;
}
