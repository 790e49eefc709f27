import { ConnectionRefusedError, DatabaseError, UniqueConstraintError } from 'sequelize';
import { describe, expect, test } from 'vitest';
import { ComputeError } from '../../worker/sweep/computeError.ts';
import { conflict } from '../errors.ts';
import { toRefusal } from './toRefusal.ts';

const databaseError = (code: string) =>
  new DatabaseError(Object.assign(new Error('from PostgreSQL'), { code, sql: 'SELECT secret' }));

describe('what a caller is told of an error', () => {
  test.each([
    ['a refusal as it is', conflict('Somebody was first.'), 409],
    ['no connection', new ConnectionRefusedError(new Error('connect ECONNREFUSED 10.0.0.7')), 503],
    ['a server that shuts down (57P01)', databaseError('57P01'), 503],
    ['a connection lost on the way (08006)', databaseError('08006'), 503],
    ['a cut connection', new Error('Connection terminated unexpectedly'), 503],
    ['a mistake in our SQL (42703)', databaseError('42703'), 500],
    ['a constraint that no service expected', new UniqueConstraintError({}), 500],
    ['a mistake in our code', new TypeError('x is undefined'), 500],
    ['something that is no error', 'thrown text', 500],
    ['a pool that is closed', new ComputeError('closed', 'closed'), 503],
    ['a thread that died', new ComputeError('crashed', 'died'), 500],
    ['a request that takes too long', new ComputeError('timeout', 'slow'), 422],
    ['a body that breaks off', Object.assign(new Error(), { status: 400, type: 'request.aborted' }), 422],
    ['a body that is too large', Object.assign(new Error(), { status: 413, type: 'entity.too.large' }), 413],
  ])('%s', (_name, error, status) => {
    expect(toRefusal(error).status).toBe(status);
  });

  test('issues of the core keep their places', () => {
    const issues = [{ path: 'cases[0].layers[1].index', message: 'is bad' }];
    expect(toRefusal(new ComputeError('refused', 'is bad', issues)).issues).toEqual(issues);
  });

  test("nothing of the server's own failures leaks", () => {
    for (const error of [databaseError('42703'), new TypeError('at /srv/app/secret.ts')]) {
      expect(JSON.stringify(toRefusal(error).toEnvelope('id'))).not.toMatch(/SELECT|secret|PostgreSQL/);
    }
  });

  test('the request id stands on failures of the server only', () => {
    expect(toRefusal(new Error('x')).toEnvelope('id-1').error.requestId).toBe('id-1');
    expect(toRefusal(conflict('x')).toEnvelope('id-1').error.requestId).toBeUndefined();
  });
});
