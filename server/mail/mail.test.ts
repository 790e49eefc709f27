import { afterAll, beforeAll, expect, test } from 'vitest';
import type { MailCatcher } from './mailCatcher.ts';
import { startMailCatcher } from './mailCatcher.ts';
import type { Mailer } from './mailer.ts';
import { createMailer } from './mailer.ts';

let catcher: MailCatcher;
let mailer: Mailer;
beforeAll(async () => {
  catcher = await startMailCatcher();
  mailer = createMailer(catcher.url, 'Skewlight <no-reply@skewlight.example>');
});
afterAll(async () => {
  mailer.close();
  await catcher.stop();
});

test.each([
  ['plain', 'Set a new password', 'Open this:\n\nhttp://127.0.0.1:4310/reset-password/abc=def\n\nBye.'],
  ['in other letters', 'Kérr – Ångström λ', 'Grüße, 1 Å = 0,1 nm\nλ = 632,8 nm'],
  ['with long lines', 'x '.repeat(60).trim(), `${'word '.repeat(100)}end`],
  ['that starts lines with dots', 'Dots', '.\n..\n.end'],
])('a mail %s arrives over SMTP as it was sent', async (_name, subject, text) => {
  await mailer.send({ to: 'grower@films.example', subject, text });
  const [newest] = catcher.mails();
  expect(newest).toMatchObject({ to: 'grower@films.example', subject, text });
});

test('the newest mails stand first, and old ones go', async () => {
  for (let count = 0; count < 205; count++) {
    await mailer.send({ to: 'a@films.example', subject: `Mail ${count}`, text: 'x' });
  }
  const subjects = catcher.mails().map((mail) => mail.subject);
  expect([subjects.length, subjects[0], subjects.at(-1)]).toEqual([200, 'Mail 204', 'Mail 5']);
});

test('a mail server that is not there is an error', async () => {
  const nowhere = createMailer('smtp://127.0.0.1:1', 'x@skewlight.example');
  await expect(nowhere.send({ to: 'a@films.example', subject: 'x', text: 'x' })).rejects.toThrow(
    /ECONNREFUSED/,
  );
});
