// @vitest-environment jsdom
import { beforeEach, expect, it } from 'vitest';
import type { ImportTable } from '../../../../shared/materialImport.ts';
import { loadImportDraft, storeImportDraft } from './importDraft.ts';

const table: ImportTable = {
  delimiter: 'tab',
  decimal: 'point',
  headerLine: 1,
  comments: [],
  columns: [
    { header: 'nm', least: 400, greatest: 800 },
    { header: 'n', least: 1, greatest: 2 },
  ],
  rowCount: 2,
  firstRows: [],
  lastRows: [],
  suggestion: null,
  warnings: [],
};

beforeEach(() => window.sessionStorage.clear());

it('brings back what was said about a table, and chooses no habit by itself', () => {
  const fresh = loadImportDraft(window.sessionStorage, 'i1', table);
  expect(fresh.answers).toEqual({});
  const said = { ...fresh, answers: { time: 'exp(+iwt)' as const } };
  said.plan = { ...said.plan, roles: ['spectral', 'n'] };
  storeImportDraft(window.sessionStorage, 'i1', said);
  expect(loadImportDraft(window.sessionStorage, 'i1', table)).toEqual(said);
  expect(loadImportDraft(window.sessionStorage, 'i2', table)).toEqual(fresh);
});

it('begins anew with what does not fit the table, or was spoilt', () => {
  const fresh = loadImportDraft(window.sessionStorage, 'i1', table);
  storeImportDraft(window.sessionStorage, 'i1', { ...fresh, plan: { ...fresh.plan, roles: ['n'] } });
  expect(loadImportDraft(window.sessionStorage, 'i1', table)).toEqual(fresh);
  window.sessionStorage.setItem('skewlight.import.i1', '{');
  expect(loadImportDraft(window.sessionStorage, 'i1', table)).toEqual(fresh);
  storeImportDraft(window.sessionStorage, 'i1', null);
  expect(window.sessionStorage.getItem('skewlight.import.i1')).toBeNull();
});
