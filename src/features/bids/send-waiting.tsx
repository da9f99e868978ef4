import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useEffect, useState } from 'react';
import { notify } from '../../ui/toast.tsx';
import { sendWaiting, useWaiting } from './waiting.ts';

/** Sends the sheets that wait, and reads the lists anew when some arrived. */
export function useSendWaiting(home: string) {
  const client = useQueryClient();
  const [isBusy, setBusy] = useState(false);
  const send = useCallback(async () => {
    setBusy(true);
    try {
      const arrived = await sendWaiting(home);
      if (arrived === 0) return;
      notify(arrived === 1 ? 'A sheet that waited is kept now' : `${arrived} sheets that waited are kept now`);
      await client.invalidateQueries({ queryKey: ['bids'] });
    } finally {
      setBusy(false);
    }
  }, [client, home]);
  return { send, isBusy };
}

const TRY_AGAIN_MS = 30_000;

/** On every page: sends waiting sheets at once, whenever a signal comes back, and now and then on a weak one. */
export function SendWaiting({ home }: { home: string }) {
  const { send } = useSendWaiting(home);
  const isWaiting = useWaiting(home).some(({ problem }) => problem === null);
  useEffect(() => {
    if (!isWaiting) return;
    const onSignal = () => void send();
    onSignal();
    window.addEventListener('online', onSignal);
    const timer = setInterval(() => navigator.onLine && onSignal(), TRY_AGAIN_MS);
    return () => {
      window.removeEventListener('online', onSignal);
      clearInterval(timer);
    };
  }, [isWaiting, send]);
  return null;
}
