import { PageHeader } from '../ui/answer-header.tsx';

export function SignUpPage() {
  return <PageHeader title="Start a shop" />;
}
