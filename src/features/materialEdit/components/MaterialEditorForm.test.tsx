// @vitest-environment jsdom
// @vitest-environment jsdom
import { QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { RouterProvider, createMemoryRouter } from 'react-router-dom';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { Material } from '../../../../shared/material.ts';
import { createQueryClient } from '../../../lib/queryClient.ts';
import { useMaterialEditor } from '../hooks/useMaterialEditor.ts';
import { blankForm } from '../model/blankForm.ts';
import { formOfMaterial } from '../model/formOfMaterial.ts';
import { buildContent, buildMaterial } from '../model/materialFixtures.ts';
import { MaterialEditorForm } from './MaterialEditorForm.tsx';

// jsdom has no canvas: of a figure it is enough that it stands with its name.
vi.mock('echarts-for-react/esm/core', () => ({ default: () => null }));

beforeEach(() => window.sessionStorage.clear());
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const { curves } = buildMaterial();
const data = buildMaterial({ id: 'data', name: 'Data', rangeNm: [500, 600] });

type Sent = { path: string; method: string; body: Record<string, unknown> };
type Answer = (sent: Sent) => Response | Promise<Response> | null;

const refuse = (status: number, message: string, issues: { path: string; message: string }[] = []) =>
  Response.json({ error: { code: status === 409 ? 'conflict' : 'invalid', message, issues } }, { status });

/** Opens the form; `answer` says what the server does with a request, the preview answers by itself. */
function open(material: Material | null, answer: Answer = () => null) {
  const sent: Sent[] = [];
  vi.stubGlobal('fetch', (path: string, init: { method?: string; body?: string } = {}) => {
    const body = JSON.parse(init.body ?? '{}') as Record<string, unknown>;
    const one = { path: path.replace('/api/v1', ''), method: init.method ?? 'GET', body };
    sent.push(one);
    const own = answer(one);
    if (own) return Promise.resolve(own);
    return Promise.resolve(one.path.endsWith('/preview') ? Response.json(curves) : Response.json(data));
  });
  const onSaved = vi.fn();
  function Harness() {
    const editor = useMaterialEditor({
      groupId: 'group',
      material,
      start: material ? formOfMaterial(material) : blankForm(),
      keptUnder: 'subject',
      onSaved,
    });
    const nextVersion = material ? (editor.startedFrom ?? 0) + 1 : null;
    return (
      <MaterialEditorForm editor={editor} groupId="group" materials={[data]} nextVersion={nextVersion} />
    );
  }
  const router = createMemoryRouter([{ path: '/', Component: Harness }]);
  render(
    <QueryClientProvider client={createQueryClient()}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
  const saves = () => sent.filter(({ path, method }) => method !== 'GET' && !path.endsWith('/preview'));
  return { sent, saves, onSaved, user: userEvent.setup() };
}

function describedBy(field: HTMLElement): string {
  const ids = (field.getAttribute('aria-describedby') ?? '').split(' ');
  return ids.map((id) => document.getElementById(id)?.textContent ?? '').join(' ');
}

const index = () => within(screen.getByRole('region', { name: /^Refractive index/ }));

async function fillIn(user: ReturnType<typeof userEvent.setup>) {
  await user.type(screen.getByLabelText('Name'), 'My glass');
  await user.type(screen.getByLabelText('Formula'), 'SiO2');
  await user.type(index().getByLabelText('Citation (required)'), 'Our own');
}

describe('the form of a material', () => {
  it('says at every field what is missing and asks nobody to store it', async () => {
    const { user, saves } = open(null);
    await user.click(screen.getByRole('button', { name: 'Save material' }));
    expect(describedBy(screen.getByLabelText('Name'))).toContain('Must not be empty');
    expect(describedBy(index().getByLabelText('Citation (required)'))).toContain('Must not be empty');
    expect(screen.getByRole('alert').textContent).toContain('index.wavelengthsNm');
    expect(saves()).toEqual([]);
  });

  it('takes a pasted table, shows it to the preview and stores what it shows', async () => {
    const { user, sent, saves, onSaved } = open(null, ({ path }) =>
      path === '/groups/group/materials' ? Response.json(buildMaterial(), { status: 201 }) : null,
    );
    await fillIn(user);
    await user.click(screen.getByLabelText('n, row 1'));
    await user.paste('nm\tn\tk\n500\t1,5\t0\n600\t1.4\t0.01');
    await screen.findByLabelText('Preview of n and k of My glass');
    const expected = { kind: 'table', wavelengthsNm: [500, 600], n: [1.5, 1.4], k: [0, 0.01] };
    expect(sent.filter(({ path }) => path.endsWith('/preview')).at(-1)?.body).toMatchObject({
      content: { index: expected },
    });
    await user.click(screen.getByRole('button', { name: 'Save material' }));
    await waitFor(() => expect(onSaved).toHaveBeenCalledOnce());
    expect(saves()).toHaveLength(1);
    expect(saves()[0]?.body).toMatchObject({
      name: 'My glass',
      class: 'dielectric',
      content: { index: expected, indexSource: { citation: 'Our own', confidence: 'measured' }, voigt: null },
    });
  });

  it("shows the server's issue of a preview at the field of its path, with or without the model in it", async () => {
    const { user } = open(null, ({ path }) =>
      path.endsWith('/preview')
        ? refuse(422, 'The constants cannot be used.', [
            { path: 'content.index.model.terms[0].cUm2', message: 'gives a pole within the range' },
            { path: 'content.index.rangeNm', message: 'must rise' },
          ])
        : null,
    );
    await user.selectOptions(screen.getByLabelText('n and k are given by'), 'sellmeier');
    await waitFor(() =>
      expect(describedBy(screen.getByLabelText('C'))).toContain('Gives a pole within the range'),
    );
    expect(index().getByText('must rise')).toBeDefined();
  });

  it('brings unsaved edits back after a reload, and lets go of them when told', async () => {
    const first = open(buildMaterial());
    await first.user.type(screen.getByLabelText('Name'), ' two');
    window.dispatchEvent(new Event('pagehide'));
    cleanup();
    const second = open(buildMaterial());
    expect(screen.getByLabelText<HTMLInputElement>('Name').value).toBe('Glass two');
    await second.user.click(screen.getByRole('button', { name: 'Discard them' }));
    expect(screen.getByLabelText<HTMLInputElement>('Name').value).toBe('Glass');
  });
});

describe('a new version', () => {
  it('is of what the edit began with; over a newer one it keeps the edits and can go on top', async () => {
    const theirs = buildMaterial({ version: 2, newestVersion: 2, author: 'B. Other' });
    const { user, saves, onSaved } = open(buildMaterial(), ({ path, method, body }) => {
      if (method === 'GET') return Response.json(theirs);
      if (!path.endsWith('/versions')) return null;
      return body['version'] === 1
        ? refuse(409, 'There is a newer version.')
        : Response.json(buildMaterial({ version: 3 }), { status: 201 });
    });
    const cell = screen.getByLabelText<HTMLInputElement>('n, row 2');
    await user.clear(cell);
    await user.type(cell, '1.6');
    await user.type(screen.getByLabelText('What changes, and why'), 'A misprint');
    await user.click(screen.getByRole('button', { name: 'Save as version 2' }));
    expect((await screen.findByText(/B. Other made version 2/)).textContent).toContain('edits are kept');
    expect(cell.value).toBe('1.6');
    await user.click(screen.getByRole('button', { name: 'Save mine as version 3' }));
    await waitFor(() => expect(onSaved).toHaveBeenCalledOnce());
    expect(saves().map(({ body }) => body['version'])).toEqual([1, 2]);
    expect(saves()[1]?.body).toMatchObject({
      note: 'A misprint',
      content: { index: { n: [1.5, 1.6] }, indexSource: buildContent().indexSource },
    });
  });

  it('is not made by a new name alone', async () => {
    const { user, saves, onSaved } = open(buildMaterial(), ({ method }) =>
      method === 'PATCH' ? Response.json(buildMaterial({ name: 'Glass two' })) : null,
    );
    await user.type(screen.getByLabelText('Name'), ' two');
    await user.click(screen.getByRole('button', { name: 'Save as version 2' }));
    await waitFor(() => expect(onSaved).toHaveBeenCalledOnce());
    expect(saves().map(({ method, path }) => [method, path])).toEqual([['PATCH', '/materials/m1']]);
  });
});

describe('a fit', () => {
  const result = {
    fitted: {
      kind: 'model',
      rangeNm: [500, 600],
      model: { name: 'cauchy', a: 1.456, bUm2: 0.0035, cUm4: 0 },
    },
    parameters: [
      { name: 'a', unit: '', value: 1.456, uncertainty: 0.0012, fixed: false },
      { name: 'cUm4', unit: 'um^4', value: 0, uncertainty: null, fixed: true },
    ],
    residuals: { wavelengthsNm: [500, 600], first: [0.001, -0.001], second: [0, 0] },
    deviation: 0.001,
    points: 2,
    iterations: 4,
    remarks: ['a and bUm2 are hardly told apart'],
  };

  async function begin(answer: Answer) {
    const opened = open(null, answer);
    await opened.user.selectOptions(screen.getByLabelText('n and k are given by'), 'cauchy');
    await opened.user.click(screen.getByText('Fit these values to a table'));
    await opened.user.selectOptions(screen.getByLabelText(/^The data/), 'data');
    await opened.user.click(screen.getByRole('button', { name: 'Fit' }));
    return opened;
  }

  it('shows values with uncertainties and remarks, and puts them into the form with their source', async () => {
    const { user, saves } = await begin(({ path }) =>
      path === '/groups/group/fits' ? Response.json(result) : null,
    );
    const table = await screen.findByRole('table', { name: 'Fitted parameters' });
    expect(table.textContent).toContain('± 0.0012');
    expect(table.textContent).toContain('held');
    expect(screen.getByText('a and bUm2 are hardly told apart')).toBeDefined();
    expect(saves()[0]?.body).toMatchObject({
      material: 'data',
      version: 1,
      target: 'index',
      start: { kind: 'model', model: { name: 'cauchy', a: 1.5 } },
      rangeNm: [500, 600],
    });
    await user.click(screen.getByRole('button', { name: 'Use these values' }));
    expect(index().getByLabelText<HTMLInputElement>('A').value).toBe('1.456');
    expect(index().getByLabelText<HTMLSelectElement>('Confidence').value).toBe('fitted');
    expect(index().getByLabelText<HTMLTextAreaElement>('Citation (required)').value).toBe(
      'A. Author, J. Opt. 1, 2 (1999)',
    );
    expect(index().getByLabelText<HTMLInputElement>('Method').value).toContain(
      'Fit of a Cauchy formula to 2 points of n and k of Data (version 1), 500–600 nm',
    );
  });

  it('can be cancelled, and says nothing then', async () => {
    const { user } = await begin(({ path }) =>
      path === '/groups/group/fits' ? new Promise<Response>(() => undefined) : null,
    );
    await user.click(await screen.findByRole('button', { name: 'Cancel' }));
    expect(await screen.findByRole('button', { name: 'Fit' })).toBeDefined();
    expect(screen.queryByRole('table', { name: 'Fitted parameters' })).toBeNull();
  });
});
