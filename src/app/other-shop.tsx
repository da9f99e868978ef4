import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { moveSession } from '../lib/session.ts';
import { Button } from '../ui/button.tsx';
import { Dialog, DialogActions } from '../ui/dialog.tsx';
import { ErrorState } from '../ui/states.tsx';

/** Another tab moved the session to another shop; nothing was saved here. Offers to come back or to follow. */
export function OtherShop({ shop, onDone }: { shop: { id: string; name: string }; onDone: () => void }) {
  const client = useQueryClient();
  const [problem, setProblem] = useState<unknown>(null);
  const onBack = async () => {
    try {
      await moveSession(shop.id);
      onDone();
      await client.invalidateQueries();
    } catch (refused) {
      setProblem(refused);
    }
  };
  return (
    <Dialog
      open
      stay
      onClose={onDone}
      title="You are in another shop now"
      note={`This page belongs to ${shop.name}, but another tab went to a different shop. Nothing was saved.`}
    >
      {problem !== null && <ErrorState error={problem} />}
      <DialogActions>
        <Button kind="main" onClick={onBack}>
          Go back to {shop.name}
        </Button>
        <Link to="/" reloadDocument className="button">
          Open the other shop
        </Link>
      </DialogActions>
    </Dialog>
  );
}
