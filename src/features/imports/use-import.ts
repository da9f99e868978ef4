import { useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import { type Import, importsApi } from '#shared/contracts/imports.ts';
import { addressOf } from '../../lib/api.ts';
import { useBooksChanged } from '../../lib/books-changed.ts';
import { importQuery, isUnderWay } from './queries.ts';

const ASK_AGAIN_MS = 700;

/**
 * One import as it stands. While the server works on it, its progress streams in; where no stream can be had, the
 * server is asked again and again.
 */
export function useImport(importId: string): Import {
  const [isStreaming, setStreaming] = useState(false);
  const { data: file } = useSuspenseQuery({
    ...importQuery(importId),
    refetchInterval: (query) =>
      query.state.data && isUnderWay(query.state.data.state) && !isStreaming ? ASK_AGAIN_MS : false,
  });
  useProgressStream(file, setStreaming);
  useBooksKeptFresh(file);
  return file;
}

function useProgressStream({ id, state }: Import, onStreaming: (isStreaming: boolean) => void): void {
  const client = useQueryClient();
  const isOpen = isUnderWay(state) && typeof EventSource === 'function';
  useEffect(() => {
    if (!isOpen) return;
    const { queryKey } = importQuery(id);
    const stream = new EventSource(addressOf(importsApi.progress, { importId: id }));
    const end = () => {
      stream.close();
      onStreaming(false);
      void client.invalidateQueries({ queryKey, exact: true });
    };
    stream.addEventListener('open', () => onStreaming(true));
    stream.addEventListener('error', end);
    stream.addEventListener('message', ({ data }: MessageEvent<string>) => {
      const told = importsApi.progress.response.parse(JSON.parse(data));
      if (!isUnderWay(told.state)) end();
      else client.setQueryData(queryKey, (file) => file && { ...file, ...told });
    });
    return () => {
      stream.close();
      onStreaming(false);
    };
  }, [client, id, isOpen, onStreaming]);
}

/** Once a file is booked, every page that was read before is out of date. */
function useBooksKeptFresh(file: Import): void {
  const changed = useBooksChanged();
  const before = useRef(file.state);
  useEffect(() => {
    if (before.current === 'committing' && file.state === 'committed') void changed();
    before.current = file.state;
  });
}
