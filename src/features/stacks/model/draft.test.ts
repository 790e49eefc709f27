// @vitest-environment jsdom
import { beforeEach, describe, expect, it } from 'vitest';
import { loadDraft, sameDraft, storeDraft } from './draft.ts';
import { buildDocument } from './stackFixtures.ts';

const draft = { name: 'Film', description: '', document: buildDocument() };

describe('the draft of a tab', () => {
  beforeEach(() => window.sessionStorage.clear());

  it('survives a reload with the version it began with', () => {
    storeDraft(window.sessionStorage, 'stack', { baseVersion: 4, draft });
    expect(loadDraft(window.sessionStorage, 'stack')).toEqual({ baseVersion: 4, draft });
    storeDraft(window.sessionStorage, 'stack', null);
    expect(loadDraft(window.sessionStorage, 'stack')).toBeNull();
  });

  it('is let go when it does not fit any more', () => {
    window.sessionStorage.setItem('skewlight.draft.stack', '{"baseVersion":4,"draft":{"name":"Film"}}');
    expect(loadDraft(window.sessionStorage, 'stack')).toBeNull();
    window.sessionStorage.setItem('skewlight.draft.stack', 'not JSON');
    expect(loadDraft(window.sessionStorage, 'stack')).toBeNull();
  });

  it('compares by what it says', () => {
    expect(sameDraft(draft, { ...draft, document: buildDocument() })).toBe(true);
    expect(sameDraft(draft, { ...draft, name: 'Other' })).toBe(false);
    expect(sameDraft(draft, { ...draft, document: buildDocument({ layers: [] }) })).toBe(false);
  });
});
