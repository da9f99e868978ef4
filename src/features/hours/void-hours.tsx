import { useMutation } from '@tanstack/react-query';
import type { HoursRow } from '#shared/contracts/hours.ts';
import { notify } from '../../ui/toast.tsx';
import { VoidDialog } from '../../ui/void-dialog.tsx';
import { useHoursWrites } from './mutations.ts';

/** Voids one row of hours. */
export function VoidHours({ hours, onClose }: { hours: HoursRow; onClose: () => void }) {
  const { voidHours } = useHoursWrites();
  const { mutate, isPending, error } = useMutation({
    mutationFn: (reason: string) => voidHours(hours, reason),
    onSuccess: () => {
      notify('Hours void');
      onClose();
    },
  });
  return (
    <VoidDialog
      what={`these hours on ${hours.rebuildTag}`}
      busy={isPending}
      error={error?.message}
      onVoid={mutate}
      onClose={onClose}
    />
  );
}
