// @vitest-environment jsdom
import { QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { MemoryRouter } from 'react-router-dom';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { MaterialImport } from '../../../../shared/materialImport.ts';
import { ownHabits } from '../../../../shared/materialImport.ts';
import { createQueryClient } from '../../../lib/queryClient.ts';
import { startTestServer } from '../../../lib/testServer.ts';
import { ImportWorkbench } from './ImportWorkbench.tsx';

const server = startTestServer();
afterEach(cleanup);
beforeEach(() => window.sessionStorage.clear());

const read: MaterialImport = {
  id: 'i1',
  groupId: 'g1',
  fileName: 'pasted table',
  bytes: 300,
  state: 'ready',
  progress: 1,
  error: null,
  exported: null,
  table: {
    delimiter: 'semicolon',
    decimal: 'comma',
    headerLine: 1,
    comments: ['# by somebody'],
    columns: [
      { header: 'E (eV)', least: 1.5, greatest: 3 },
      { header: 'eps1', least: -20, greatest: -3 },
      { header: 'eps2', least: -26, greatest: -10 },
    ],
    rowCount: 2,
    firstRows: [
      { line: 2, cells: [1.5, -20, -26] },
      { line: 3, cells: [3, -3, null] },
    ],
    lastRows: [{ line: 3, cells: [3, -3, null] }],
    suggestion: {
      spectral: { column: 0, unit: 'eV' },
      index: { from: 'eps1, eps2', eps1: 1, eps2: 2 },
      voigt: null,
      indexOf: null,
      habits: ownHabits,
    },
    warnings: [{ code: 'empty-cells', message: 'One cell is empty.', lines: [3] }],
  },
};

const refusal = {
  error: {
    code: 'invalid',
    message: 'The table cannot be converted so.',
    issues: [{ path: 'habits.time', message: 'eps2 < 0 after the conversion: choose exp(+iwt)' }],
  },
};

/** What the server was asked, and the state that it gives the import. */
let asked: { url: string; body: unknown }[];
let state: MaterialImport;

beforeEach(() => {
  asked = [];
  state = read;
  server.answer((request, response) => {
    let text = '';
    request.on('data', (part: Buffer) => (text += part.toString()));
    request.on('end', () => {
      const url = request.url ?? '';
      const body: unknown = text === '' ? null : JSON.parse(text);
      asked.push({ url, body });
      const preview = url.endsWith('/preview');
      response.writeHead(preview ? 422 : 200, { 'content-type': 'application/json' });
      const reading = { ...state, state: 'reading', progress: 0.4, table: null, error: null };
      const answer = preview ? refusal : request.method === 'POST' ? reading : state;
      response.end(JSON.stringify(answer));
    });
  });
});

function Harness({ opened }: { opened: string | null }) {
  const [importId, setImportId] = useState(opened);
  return (
    <ImportWorkbench
      groupId="g1"
      importId={importId}
      onImport={setImportId}
      target={null}
      materials={[]}
      loadMaterial={() => Promise.reject(new Error('not asked'))}
      onKept={() => undefined}
    />
  );
}

function open(importId: string | null) {
  render(
    <QueryClientProvider client={createQueryClient()}>
      <MemoryRouter>
        <Harness opened={importId} />
      </MemoryRouter>
    </QueryClientProvider>,
  );
  return userEvent.setup();
}

const pasted = 'E (eV);eps1;eps2\n1,5;-20;-26';

async function paste(user: ReturnType<typeof open>) {
  await user.click(screen.getByRole('tab', { name: 'Paste a table' }));
  await user.click(screen.getByLabelText('Table'));
  await user.paste(pasted);
  await user.click(screen.getByRole('button', { name: 'Read this table' }));
}

const step = (name: RegExp) => screen.getByRole('region', { name });

describe('the import of a table', () => {
  it('follows the reading and fills in what the server suggests, but no habit', async () => {
    const user = open(null);
    await paste(user);
    expect((await screen.findByRole('progressbar', { name: 'Reading the table' })).ariaValueNow).toBe('40');
    const meaning = await screen.findByLabelText<HTMLSelectElement>('Meaning of column 2, eps1');
    expect(meaning.value).toBe('eps1');
    expect(asked[0]).toEqual({ url: '/api/v1/groups/g1/imports', body: { text: pasted } });
    expect(within(step(/Step 1/)).getByText(/One cell is empty/).textContent).toContain('Line 3');
    const choices = within(step(/Step 3/)).getAllByRole<HTMLInputElement>('radio');
    expect(choices.map(({ checked }) => checked)).toEqual([false, false]);
    expect(step(/Step 4/).textContent).toContain('one question is still open');
    expect(asked.some(({ url }) => url.endsWith('/preview'))).toBe(false);
  });

  it('asks for a conversion once every habit is chosen, and says which step mends a refusal', async () => {
    const user = open('i1');
    await user.click(await screen.findByRole('radio', { name: 'exp(−iωt)' }));
    const refused = await screen.findByText(/choose exp\(\+iwt\)/, undefined, { timeout: 5000 });
    expect(within(refused).getByRole('link').getAttribute('href')).toBe('#step-signs');
    expect(asked.find(({ url }) => url.endsWith('/preview'))?.body).toEqual({
      spectral: { column: 0, unit: 'eV' },
      index: { from: 'eps1, eps2', eps1: 1, eps2: 2 },
      voigt: null,
      indexOf: null,
      habits: { ...ownHabits, time: 'exp(-iwt)' },
    });
    expect(step(/Step 5/).textContent).toContain('asked once there is a result');
  });

  it('says what the columns lack and takes the questions back until it is mended', async () => {
    const user = open('i1');
    await user.selectOptions(await screen.findByLabelText('Meaning of column 1, E (eV)'), 'unused');
    expect(screen.getByText(/Say which column holds the wavelength/)).not.toBeNull();
    expect(screen.queryByRole('radio')).toBeNull();
    await user.selectOptions(screen.getByLabelText('Meaning of column 1, E (eV)'), 'spectral');
    expect(screen.getAllByRole('radio')).toHaveLength(2);
  });

  it('comes back after a reload with what was answered', async () => {
    const user = open('i1');
    await user.selectOptions(await screen.findByLabelText('Unit of column 1'), 'THz');
    await user.click(screen.getByRole('radio', { name: 'exp(+iωt)' }));
    cleanup();
    open('i1');
    expect((await screen.findByLabelText<HTMLSelectElement>('Unit of column 1')).value).toBe('THz');
    expect(screen.getByRole<HTMLInputElement>('radio', { name: 'exp(+iωt)' }).checked).toBe(true);
  });

  it('shows a refusal with its remedy and keeps what was pasted', async () => {
    state = {
      ...read,
      state: 'refused',
      table: null,
      error: 'Line 2 has 2 cells, line 1 has 3. Mend line 2.',
    };
    const user = open(null);
    await paste(user);
    expect(await screen.findByText(/Mend line 2/)).not.toBeNull();
    expect(screen.getByLabelText<HTMLTextAreaElement>('Table').value).toBe(pasted);
  });

  it('refuses an empty text and a file that is too large before anything is sent', async () => {
    const user = open(null);
    const large = new File(['1'], 'all.csv');
    Object.defineProperty(large, 'size', { value: 1_000_000_000 });
    await user.upload(screen.getByLabelText('Choose a file'), large);
    expect(screen.getByText(/all.csv has 1,000 MB; at most 20 MB can be read/)).not.toBeNull();
    await user.click(screen.getByRole('tab', { name: 'Paste a table' }));
    await user.click(screen.getByRole('button', { name: 'Read this table' }));
    expect(screen.getByText('Paste the rows of the table first.')).not.toBeNull();
    expect(asked).toEqual([]);
  });
});
