import { LinkButton } from '../ui/button.tsx';
import { PageHeader } from '../ui/answer-header.tsx';

/** An address that leads nowhere, or nowhere that this person may see: the two look the same on purpose. */
export function NotFoundPage() {
  return (
    <>
      <PageHeader
        title="Nothing stands at this address"
        note="It may have moved, or belong to a shop that you are not a member of."
      />
      <LinkButton to="/">To the start</LinkButton>
    </>
  );
}
