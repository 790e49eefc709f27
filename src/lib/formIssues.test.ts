import { describe, expect, it, vi } from 'vitest';
import { ApiError } from './apiClient.ts';
import { showServerIssues, toFieldName } from './formIssues.ts';

describe('toFieldName', () => {
  it('turns the path of the API into the name of a form field', () => {
    expect(toFieldName('layers[2].thicknessNm')).toBe('layers.2.thicknessNm');
    expect(toFieldName('cases[0].layers[1].index[1]')).toBe('cases.0.layers.1.index.1');
    expect(toFieldName('email')).toBe('email');
  });
});

describe('showServerIssues', () => {
  it('keeps an issue that belongs to no field in sight', () => {
    const setError = vi.fn();
    const issues = [
      { path: 'name', message: 'must not be empty' },
      { path: 'document.layers[0].id', message: 'is used twice: a' },
    ];
    showServerIssues<{ name: string }>(new ApiError(422, 'invalid', 'Refused.', issues), setError, ['name']);
    expect(setError).toHaveBeenCalledTimes(2);
    expect(setError).toHaveBeenCalledWith(
      'name',
      { type: 'server', message: 'must not be empty' },
      { shouldFocus: true },
    );
    expect(setError).toHaveBeenCalledWith('root.server', {
      type: 'server',
      message: 'Refused.\ndocument.layers[0].id: is used twice: a',
    });
  });
});
