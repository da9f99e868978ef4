import { fireEvent, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { type Import, importsApi } from '#shared/contracts/imports.ts';
import { ImportsPage } from '../../../src/pages/imports.tsx';
import { buildSession, fakeServer, idOf, on, Refusal, signedIn } from '../../support/fake-server.ts';
import { showPage } from '../../support/show-page.tsx';
import { buildImport, ID } from './support.tsx';

afterEach(() => vi.unstubAllGlobals());

const csv = (name: string) => new File(['Date,Car'], name, { type: 'text/csv' });
const LEADS_ON = `at /s/${idOf('s')}/import/${ID}`;

/** The list of imports; `answer` is what an upload comes to. */
function show(answer: () => Import = () => buildImport(null, { state: 'reading' }), rows: readonly Import[] = []) {
  const server = fakeServer([
    signedIn(buildSession()),
    on(importsApi.list, () => ({ rows: [...rows], next: null })),
    on(importsApi.upload, answer),
  ]);
  showPage(<ImportsPage />, { path: '/s/:shopId/import', address: '/s/s/import' });
  return server;
}
const choose = async (...files: File[]) =>
  userEvent.upload(await screen.findByLabelText('File to bring in'), files, { applyAccept: false });

function refusing(problem: Refusal['problem'] & { type?: string }, then?: () => Import) {
  let times = 0;
  return () => {
    times += 1;
    if (times === 1 || !then) throw new Refusal(problem);
    return then();
  };
}

describe('bringing files in', () => {
  it('teaches when empty, and leads to a file once it is uploaded', async () => {
    show();
    expect(await screen.findByText('Every file that was brought in will stand here')).toBeInTheDocument();
    await choose(csv('old.csv'));
    expect(await screen.findByText(LEADS_ON)).toBeInTheDocument();
  });

  it('takes several files as one import', async () => {
    const { asked } = show();
    await choose(csv('2018.csv'), csv('2019.csv'));
    expect(await screen.findByText(LEADS_ON)).toBeInTheDocument();
    expect(asked).toEqual(['POST /api/imports 2018.csv 2019.csv']);
  });

  it('takes files that are dropped anywhere', async () => {
    const { asked } = show();
    await screen.findByText('Drop old spreadsheets here');
    fireEvent.drop(window, { dataTransfer: { files: [csv('a.csv'), csv('b.csv')] } });
    expect(await screen.findByText(LEADS_ON)).toBeInTheDocument();
    expect(asked).toEqual(['POST /api/imports a.csv b.csv']);
  });

  it('says of each file why it cannot come, and brings in the others', async () => {
    const { asked } = show();
    await choose(csv('2018.csv'), new File([], 'empty.csv'), new File(['x'], 'receipt.jpg', { type: 'image/jpeg' }));
    const alert = within(await screen.findByRole('alert'));
    expect(alert.getByRole('heading')).toHaveTextContent('2 files cannot come in');
    expect(alert.getByText('It is empty.')).toBeInTheDocument();
    expect(alert.getByText(/picture or a recording/)).toBeInTheDocument();
    expect(asked).toEqual([]);
    await userEvent.click(alert.getByRole('button', { name: 'Bring in the other one' }));
    expect(await screen.findByText(LEADS_ON)).toBeInTheDocument();
    expect(asked).toEqual(['POST /api/imports 2018.csv']);
  });

  it('keeps the files when the server refuses them, and tries again without one', async () => {
    const { asked } = show(
      refusing({ status: 422, detail: 'b.csv is a picture, whatever its name says.' }, () => buildImport(null)),
    );
    await choose(csv('a.csv'), csv('b.csv'));
    expect(await screen.findByText(/b\.csv is a picture/)).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'Leave out b.csv' }));
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByText(LEADS_ON)).toBeInTheDocument();
    expect(asked.at(-1)).toBe('POST /api/imports a.csv');
  });

  it('tells at the place why the only file is refused', async () => {
    show(refusing({ status: 422, detail: 'This is a picture, whatever its name says.' }));
    await choose(csv('old.csv'));
    expect(await screen.findByRole('alert')).toHaveTextContent('This is a picture');
  });

  it('says when a file is in already, and brings it in again only when told', async () => {
    const problem = { status: 409, detail: 'This very file came in before.', type: '/problems/already-in' };
    show(refusing(problem, () => buildImport(null, { state: 'reading' })));
    await choose(csv('old.csv'));
    expect(await screen.findByText('old.csv is in already')).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'Bring it in once more all the same' }));
    expect(await screen.findByText(LEADS_ON)).toBeInTheDocument();
  });
});

describe('pasting cells', () => {
  const cells = 'Date\tCar\tPaid\n2020-01-02\t13 F-150\t"10\n00"\n';

  it('takes cells that are pasted anywhere, says how many, and brings them in as a file', async () => {
    const { asked } = show();
    await screen.findByText('Drop old spreadsheets here');
    fireEvent.paste(document.body, { clipboardData: { getData: () => cells } });
    const field = await screen.findByLabelText('Cells');
    expect(field).toHaveValue(cells);
    expect(field).toHaveAccessibleDescription('2 rows of up to 3 cells.');
    await userEvent.click(screen.getByRole('button', { name: 'Bring these cells in' }));
    expect(await screen.findByText(LEADS_ON)).toBeInTheDocument();
    expect(asked).toEqual(['POST /api/imports Pasted cells.tsv']);
  });

  it('offers a place to paste into, for hands without a keyboard', async () => {
    const { asked } = show();
    await userEvent.click(await screen.findByRole('button', { name: 'Paste cells' }));
    expect(screen.getByRole('button', { name: 'Bring these cells in' })).toBeDisabled();
    await userEvent.click(screen.getByLabelText('Cells'));
    await userEvent.paste(cells);
    await userEvent.click(screen.getByRole('button', { name: 'Bring these cells in' }));
    expect(await screen.findByText(LEADS_ON)).toBeInTheDocument();
    expect(asked).toEqual(['POST /api/imports Pasted cells.tsv']);
  });
});

describe('the list of imports', () => {
  it('shows first what is under way or waits for a look, and leads back to it', async () => {
    const others = [
      buildImport(null, { id: idOf('a'), fileName: 'in.csv', state: 'committed' }),
      buildImport(null, { id: idOf('b'), fileName: 'waits.csv', state: 'ready' }),
      buildImport(null, { id: idOf('c'), fileName: 'slow.csv', state: 'reading' }),
    ];
    show(undefined, others);
    const waiting = within(await screen.findByRole('region', { name: 'Files that are not booked yet' }));
    expect(waiting.getAllByRole('link').map((link) => link.textContent)).toEqual(['waits.csv', 'slow.csv']);
    expect(within(screen.getByRole('region', { name: 'Files brought in' })).getByRole('link')).toHaveTextContent(
      'in.csv',
    );
    await userEvent.click(waiting.getByRole('link', { name: 'waits.csv' }));
    expect(screen.getByText(`at /s/${idOf('s')}/import/${idOf('b')}`)).toBeInTheDocument();
  });
});
