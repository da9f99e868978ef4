import { act, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { Progress } from '#shared/contracts/imports.ts';
import { read } from '../../imports/support.ts';
import { buildImport, ID, open, serve, SMALL } from './support.tsx';

afterEach(() => {
  vi.unstubAllGlobals();
  FakeStream.all.length = 0;
});

/** As much of EventSource as the page needs; `tell` sends one event. */
class FakeStream extends EventTarget {
  static readonly all: FakeStream[] = [];
  readonly url: string;
  isClosed = false;

  constructor(url: string) {
    super();
    this.url = url;
    FakeStream.all.push(this);
  }

  close(): void {
    this.isClosed = true;
  }

  tell(progress: Progress): void {
    act(() => void this.dispatchEvent(new MessageEvent('message', { data: JSON.stringify(progress) })));
  }
}

describe('while the server is at work', () => {
  it('asks again and again where no stream can be had, then shows what was understood', async () => {
    const { become } = serve(buildImport(null, { state: 'reading', progress: 0.4 }));
    open();
    expect(await screen.findByRole('progressbar')).toHaveAttribute('aria-valuenow', '40');
    become({ state: 'ready', reading: read(SMALL), progress: null });
    expect(await screen.findByText('3 of 6 rows')).toBeInTheDocument();
  });

  it('follows the stream, and reads the import once it ended', async () => {
    vi.stubGlobal('EventSource', FakeStream);
    const { become } = serve(buildImport(null, { state: 'reading', progress: null }));
    open();
    const bar = await screen.findByRole('progressbar');
    await waitFor(() => expect(FakeStream.all.at(-1)?.url).toBe(`/api/imports/${ID}/progress`));
    const stream = FakeStream.all.at(-1);
    stream?.tell({ state: 'reading', progress: 0.7 });
    await waitFor(() => expect(bar).toHaveAttribute('aria-valuenow', '70'));
    become({ state: 'ready', reading: read(SMALL) });
    stream?.tell({ state: 'ready', progress: null });
    expect(await screen.findByText('3 of 6 rows')).toBeInTheDocument();
    expect(stream?.isClosed).toBe(true);
  });

  it('falls back to asking when the stream breaks', async () => {
    vi.stubGlobal('EventSource', FakeStream);
    const { become } = serve(buildImport(null, { state: 'committing', progress: 0.5 }));
    open();
    await screen.findByRole('progressbar');
    await waitFor(() => expect(FakeStream.all).toHaveLength(1));
    become({ state: 'ready', reading: read(SMALL) });
    act(() => void FakeStream.all.at(-1)?.dispatchEvent(new Event('error')));
    expect(await screen.findByText('3 of 6 rows')).toBeInTheDocument();
  });
});

describe('booking and taking out', () => {
  const small = () => buildImport(read('Date,Car,What for,Paid\n2020-01-02,13 F-150,Parts,10.00'));

  it('books by one press and says where to go; takes out after asking', async () => {
    const { asked } = serve(small());
    open();
    await userEvent.click(await screen.findByRole('button', { name: 'Book 1 row' }));
    expect(await screen.findByRole('link', { name: 'Did the work pay this year?' })).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'Take it out again' }));
    await userEvent.click(screen.getByRole('button', { name: 'Take it out' }));
    expect(await screen.findByText(/the books are as they were before it/)).toBeInTheDocument();
    expect(asked).toEqual([`POST /api/imports/${ID}/commit`, `POST /api/imports/${ID}/undo`]);
  });

  it('says why a file is not taken out any more', async () => {
    const { refuseOnce } = serve({ ...small(), state: 'committed' });
    refuseOnce({ status: 409, detail: 'An entry of it was changed since.' });
    open();
    await userEvent.click(await screen.findByRole('button', { name: 'Take it out again' }));
    await userEvent.click(screen.getByRole('button', { name: 'Take it out' }));
    expect(await screen.findByText('An entry of it was changed since.')).toBeInTheDocument();
  });

  it('keeps the file and what was understood in view while it is read again', async () => {
    const file = small();
    const { become } = serve(file, { reread: { state: 'reading', reading: null, progress: 0.25 } });
    open();
    await userEvent.selectOptions(await screen.findByLabelText('What What for holds'), 'Vendor');
    await userEvent.click(screen.getByRole('button', { name: 'Read again with 1 change' }));
    expect(await screen.findByText('Reading it again. 25 %')).toBeInTheDocument();
    expect(screen.getByRole('grid', { name: 'Rows of the file' })).toBeInTheDocument();
    become({ state: 'ready', reading: file.reading, progress: null });
    expect(await screen.findByText('Everything was understood. Look it over, then book it.')).toBeInTheDocument();
  });
});
