import { describe, expect, test } from 'vitest';
import { readConfig } from './config.ts';

const minimal = { DATABASE_URL: 'postgres://u:p@127.0.0.1:5432/skewlight' };
const production = {
  ...minimal,
  NODE_ENV: 'production',
  SESSION_SECRET: 'x'.repeat(32),
  PUBLIC_URL: 'https://skewlight.example/',
  MAIL_URL: 'smtps://mail.example',
};

describe('the environment', () => {
  test('needs only a database outside production', () => {
    const config = readConfig({ ...minimal, PORT: '', SESSION_SECRET: '' });
    expect(config).toMatchObject({ port: 4310, host: '127.0.0.1', demo: true, compute: true, mailUrl: null });
    expect(config.sessionSecret).not.toBe(readConfig(minimal).sessionSecret);
  });

  test('is complete in production, where there is no demo whatever DEMO says', () => {
    const config = readConfig({ ...production, DEMO: 'on' });
    expect(config).toMatchObject({ production: true, demo: false, publicUrl: 'https://skewlight.example' });
  });

  test.each(['SESSION_SECRET', 'PUBLIC_URL', 'MAIL_URL'])(
    'refuses to start in production without %s',
    (name) => {
      expect(() => readConfig({ ...production, [name]: undefined })).toThrow(
        `${name}: is required in production`,
      );
    },
  );

  test('names everything that is wrong at once', () => {
    const wrong = { PORT: '70000', COMPUTE: 'yes', SESSION_SECRET: 'short', DATABASE_URL: undefined };
    const read = () => readConfig(wrong);
    for (const name of Object.keys(wrong)) expect(read).toThrow(name);
  });
});
