import { PageHeader } from '../ui/answer-header.tsx';

export function OverrunsPage() {
  return <PageHeader title="Where does the money run over?" />;
}
