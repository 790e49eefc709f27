// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { MemoryRouter } from 'react-router-dom';
import { afterEach, describe, expect, it } from 'vitest';
import type { Issue } from '../../../../shared/error.ts';
import type { MaterialSummary } from '../../../../shared/material.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import { stackDocumentSchema } from '../../../../shared/stack.ts';
import { listLayers } from '../model/items.ts';
import type { Materials } from '../model/media.ts';
import { buildBlock, buildDocument, buildLayer, buildMaterials } from '../model/stackFixtures.ts';
import { FilmDrawing } from './FilmDrawing.tsx';

afterEach(cleanup);

const gold: MaterialSummary = {
  id: 'au',
  version: 2,
  name: 'Gold',
  formula: 'Au',
  class: 'noble',
  groupId: null,
  rangeNm: [188, 1937],
  voigtRangeNm: null,
  preferred: true,
  citation: 'Measured on evaporated films, 1972',
  confidence: 'measured',
  voigtConfidence: null,
  indexKind: 'table',
  voigtKind: null,
  anisotropy: null,
  updatedAt: '2026-03-01T09:00:00.000Z',
};

type Setup = {
  document?: StackDocument;
  editable?: boolean;
  issues?: Issue[];
  rangeNm?: [number, number];
  materials?: Materials;
};

/** The drawing on a document that lives in the test; `current()` is what it has become. */
function show({
  document = buildDocument(),
  editable = true,
  issues = [],
  rangeNm = [632.8, 632.8],
  materials = buildMaterials(),
}: Setup = {}) {
  let latest = document;
  function Harness() {
    const [film, setFilm] = useState(document);
    latest = film;
    return (
      <FilmDrawing
        document={film}
        materials={new Map([...materials, ['au', gold]])}
        library={[gold]}
        point={film.workingPoint}
        kerr={{ rotationDeg: 0.04, ellipticityDeg: 0.06 }}
        rangeNm={rangeNm}
        issues={issues}
        edit={editable ? (change) => setFilm(change) : null}
      />
    );
  }
  render(<Harness />, { wrapper: MemoryRouter });
  return { user: userEvent.setup(), current: () => latest };
}

const ids = (document: StackDocument) => listLayers(document.layers).map(({ id }) => id);

describe('the drawing as editor', () => {
  it('changes a thickness where it stands, with every keystroke', async () => {
    const { user, current } = show();
    const box = screen.getByRole('spinbutton', { name: /thickness of Pt, layer 1/ });
    await user.click(box);
    await user.keyboard('4.5');
    expect(current().layers[0]).toMatchObject({ thicknessNm: 4.5 });
    await user.keyboard('{Backspace}{Backspace}{Backspace}-2');
    expect(current().layers[0]).toMatchObject({ thicknessNm: 4 });
    expect(screen.getByRole('alert').textContent).toContain('at least 0');
  });

  it('moves a layer by keyboard and keeps the focus on its handle', async () => {
    const { user, current } = show();
    screen.getByRole('button', { name: 'Move Pt, layer 1' }).focus();
    await user.keyboard('{Alt>}{ArrowDown}{/Alt}');
    expect(ids(current())).toEqual(['co', 'pt', 'ta']);
    await new Promise((resolve) => requestAnimationFrame(resolve));
    expect(document.activeElement?.getAttribute('aria-label')).toBe('Move Pt, layer 2');
  });

  it('adds, duplicates, wraps and removes from the menu of a layer, always as a valid document', async () => {
    const { user, current } = show();
    const choose = async (item: string | RegExp) => {
      await user.click(screen.getByRole('button', { name: /Actions for Co, layer/ }));
      await user.click(screen.getByRole('menuitem', { name: item }));
      expect(stackDocumentSchema.safeParse(current()).success).toBe(true);
    };
    await choose('Add a layer above');
    expect(ids(current()).indexOf('co')).toBe(2);
    await user.click(screen.getAllByRole('button', { name: /Actions for Co, layer/ })[0]!);
    await user.click(screen.getByRole('menuitem', { name: 'Remove' }));
    expect(ids(current())).toEqual(['pt', 'co', 'ta']);
    await choose('Repeat as a block');
    expect(screen.getByRole('listitem', { name: 'block 2, repeated 2 times' })).toBeTruthy();
    await user.click(screen.getByRole('spinbutton', { name: /how often block 2/ }));
    await user.keyboard('20');
    expect(current().layers[1]).toMatchObject({ repeat: 20 });
  });

  it('turns m with the arrow keys and names the geometry', async () => {
    const { user, current } = show();
    const dial = screen.getByRole('slider', { name: /direction of m in Co/ });
    expect(dial.getAttribute('aria-valuetext')).toBe('polar, +z');
    dial.focus();
    await user.keyboard('{ArrowLeft>6/}');
    expect(current().layers[1]).toMatchObject({ m: [1, 0, 0] });
    expect(dial.getAttribute('aria-valuetext')).toBe('longitudinal, +x');
  });

  it('takes a material from the library, and its m away where it is not magnetic', async () => {
    const { user, current } = show();
    await user.click(screen.getByRole('button', { name: 'Material of layer 2: Co' }));
    await user.type(screen.getByRole('combobox', { name: 'Find a material' }), 'gold{Enter}');
    expect(current().layers[1]).toEqual({ id: 'co', medium: { material: 'au', version: 2 }, thicknessNm: 1 });
  });

  it('takes constants typed in, which make the layer magnetic once there is a Q', async () => {
    const { user, current } = show();
    await user.click(screen.getByRole('button', { name: /Material of layer 3/ }));
    const panel = within(screen.getByRole('dialog', { name: 'Material of layer 3' }));
    await user.clear(panel.getByRole('spinbutton', { name: 'Re Q' }));
    await user.type(panel.getByRole('spinbutton', { name: 'Re Q' }), '0.03');
    expect(current().layers[2]).toMatchObject({
      medium: { index: [3.5, 3.6], voigt: [0.03, 0] },
      m: [0, 0, 1],
    });
  });

  it('offers to use a constant of one wavelength at others, and says so afterwards', async () => {
    const { user, current } = show({ rangeNm: [500, 700] });
    await user.click(screen.getByRole('button', { name: 'Use it at other wavelengths too' }));
    expect(current().layers[1]).toMatchObject({ medium: { material: 'co', assumeConstant: true } });
    expect(
      within(screen.getByRole('list', { name: 'Cautions' })).getByText(/used at 500–700 nm too/),
    ).toBeTruthy();
  });

  it('says that a material has a newer version, and takes it only when asked', async () => {
    const newer = new Map(
      [...buildMaterials()].map(([id, one]) => [id, { ...one, version: id === 'co' ? 2 : 1 }]),
    );
    const { user, current } = show({ materials: newer });
    const row = within(screen.getByRole('listitem', { name: 'Co, layer 2' }));
    expect(row.getByText(/Co version 1; version 2 exists/)).toBeTruthy();
    expect(row.getByRole('link', { name: 'what changed' }).getAttribute('href')).toBe(
      '/materials/co#history',
    );
    expect(current()).toEqual(buildDocument());
    await user.click(screen.getByRole('button', { name: 'Take version 2' }));
    expect(current().layers[1]).toMatchObject({ medium: { material: 'co', version: 2 }, m: [0, 0, 1] });
    expect(screen.queryByText(/version 2 exists/)).toBeNull();
  });

  it('sets the temperature of a magnetic layer once everything is known, and takes it away again', async () => {
    const { user, current } = show();
    await user.click(screen.getByRole('button', { name: /Magnetization of Co, layer 2/ }));
    const panel = within(screen.getByRole('dialog', { name: 'Magnetization of Co, layer 2' }));
    await user.click(panel.getByText('Temperature'));
    // Invented numbers: 1 - (300/600)^1 = 0.5 and 1 - (450/600)^1 = 0.25, so Q halves.
    const entries = { 'T (K)': '450', 'Curie T (K)': '600', a: '1', b: '1' };
    for (const [label, text] of Object.entries(entries)) await user.type(panel.getByLabelText(label), text);
    await user.clear(panel.getByLabelText('Q known at (K)'));
    await user.type(panel.getByLabelText('Q known at (K)'), '300');
    expect(panel.getByRole('status').textContent).toBe('Still needed: where they come from.');
    expect(current()).toEqual(buildDocument());
    await user.type(panel.getByLabelText('Where Tc, a and b come from'), 'mine');
    const thermal = { temperatureK: 450, referenceK: 300, curieK: 600, a: 1, b: 1, citation: 'mine' };
    expect(current().layers[1]).toMatchObject({ id: 'co', thermal });
    expect(stackDocumentSchema.safeParse(current()).success).toBe(true);
    expect(screen.getByText('T 450 K: Q × 0.5')).toBeTruthy();
    await user.click(panel.getByRole('button', { name: 'Use Q as it is known' }));
    expect(current()).toEqual(buildDocument());
  });

  it('does not use a temperature at which Q cannot have been known, and says why at its field', async () => {
    const thermal = { temperatureK: 450, referenceK: 300, curieK: 600, a: 1, b: 1, citation: 'mine' };
    const layers = buildDocument().layers.map((layer) => (layer.id === 'co' ? { ...layer, thermal } : layer));
    const { user, current } = show({ document: buildDocument({ layers }) });
    await user.click(screen.getByRole('button', { name: /Magnetization of Co, layer 2/ }));
    await user.type(screen.getByLabelText('Q known at (K)'), '0');
    expect(screen.getByText(/Must be below the Curie temperature \(600 K\)/)).toBeTruthy();
    expect(current().layers[1]).toMatchObject({ thermal });
  });

  it('shows an issue of the server at the layer it names, once for all states', () => {
    show({
      issues: [0, 1, 2].map((state) => ({
        path: `cases[${state}].layers[1].voigt`,
        message: 'must be smaller than 1',
      })),
    });
    const row = screen.getByRole('listitem', { name: 'Co, layer 2' });
    expect(within(row).getAllByText(/must be smaller than 1/)).toHaveLength(1);
  });

  it('drags a layer to another place and can be let go with Escape', () => {
    const { current } = show();
    // jsdom lays nothing out: the rows are given the places they would have.
    document.querySelectorAll<HTMLElement>('[data-drop-id]').forEach((row, index) => {
      row.getBoundingClientRect = () => new DOMRect(0, index * 40, 300, 40);
    });
    const handle = screen.getByRole('button', { name: /Move .*layer 3/ });
    fireEvent.pointerDown(handle, { button: 0, clientY: 100 });
    fireEvent.pointerMove(window, { clientY: 3 });
    fireEvent.keyDown(window, { key: 'Escape' });
    fireEvent.pointerUp(window);
    expect(ids(current())).toEqual(['pt', 'co', 'ta']);
    fireEvent.pointerDown(handle, { button: 0, clientY: 100 });
    fireEvent.pointerMove(window, { clientY: 3 });
    fireEvent.pointerUp(window);
    expect(ids(current())).toEqual(['ta', 'pt', 'co']);
  });
});

describe('the drawing as picture', () => {
  it('has nothing to press or type for those who may not change it', () => {
    show({
      editable: false,
      document: buildDocument({ layers: [buildBlock([buildLayer()]), ...buildDocument().layers.slice(1)] }),
    });
    expect(screen.queryAllByRole('button')).toEqual([]);
    expect(screen.queryAllByRole('spinbutton')).toEqual([]);
    expect(screen.queryAllByRole('textbox')).toEqual([]);
    expect(screen.queryAllByRole('slider')).toEqual([]);
    expect(screen.getByRole('listitem', { name: 'block 1, repeated 20 times' })).toBeTruthy();
    expect(screen.getByRole('img', { name: 'm of Co, layer 2: polar, +z' })).toBeTruthy();
  });
});
