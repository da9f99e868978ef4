import { PageHeader } from '../ui/answer-header.tsx';

export function LedgerPage() {
  return <PageHeader title="Ledger" />;
}
