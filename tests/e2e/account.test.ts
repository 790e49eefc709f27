import { afterAll, beforeAll, expect, it } from 'vitest';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import type { Visitor } from './visitor.ts';

// A new person from the sign-up over a forgotten password back in.

const EMAIL = `newcomer-${process.pid}@northgate.example`;
const FIRST_PASSWORD = 'first-password-1';
const SECOND_PASSWORD = 'second-password-2';

let site: Site;
let newcomer: Visitor;

beforeAll(async () => {
  site = await startSite();
  newcomer = await site.visit();
});

afterAll(async () => site?.stop());

async function signIn({ page }: Visitor, password: string): Promise<void> {
  await page.getByLabel('E-mail').fill(EMAIL);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
}

it('makes an account with a personal group, in which a stack can be made at once', async () => {
  const { page } = newcomer;
  await newcomer.open('/sign-in');
  await page.getByRole('link', { name: 'Make an account' }).click();
  await page.getByLabel('Name').fill('N. Comer');
  await page.getByLabel('E-mail').fill(EMAIL);
  await page.getByLabel('Password').fill('short');
  await page.getByRole('button', { name: 'Make an account' }).click();
  await page.getByText('Must have at least 10 characters').waitFor();
  await page.getByLabel('Password').fill(FIRST_PASSWORD);
  await page.getByRole('button', { name: 'Make an account' }).click();
  await page.getByText('Your personal group.').waitFor();
  await page.getByText('No stacks yet').waitFor();

  await page.getByRole('button', { name: 'New stack' }).click();
  await page.getByLabel('Name').fill('My first film');
  await page.getByRole('button', { name: /^Make|^Create/ }).click();
  await page.waitForURL(/\/stacks\//);
  expect(await page.getByLabel('Name of the stack').inputValue()).toBe('My first film');
  expect(newcomer.complaints).toEqual([]);
});

it('sets a new password with the link of a caught mail, once', async () => {
  const forgetful = await site.visit();
  const { page } = forgetful;
  await forgetful.open('/sign-in');
  await page.getByRole('link', { name: 'Forgot the password?' }).click();
  // Both pages ask for an e-mail address.
  await page.getByRole('heading', { level: 1, name: 'Forgot the password' }).waitFor();
  await page.getByLabel('E-mail').fill(EMAIL);
  await page.getByRole('button', { name: 'Send the link' }).click();
  await page.getByText('a mail with a link is on its way').waitFor();

  await forgetful.open('/development/mails');
  const mail = page.getByRole('listitem').filter({ hasText: EMAIL });
  const link = mail.getByRole('link');
  const address = (await link.getAttribute('href')) ?? '';
  await link.click();
  await page.getByLabel('New password').fill(SECOND_PASSWORD);
  await page.getByRole('button', { name: 'Set the password' }).click();
  await page.getByText('The new password holds from now on.').waitFor();
  await page.getByRole('link', { name: 'Sign in with it' }).click();

  await signIn(forgetful, FIRST_PASSWORD);
  await page.getByRole('alert').filter({ hasText: 'do not match an account' }).waitFor();
  await signIn(forgetful, SECOND_PASSWORD);
  await page.getByRole('link', { name: 'My first film' }).waitFor();

  await forgetful.open(address);
  await page.getByLabel('New password').fill('third-password-3');
  await page.getByRole('button', { name: 'Set the password' }).click();
  await page.getByText('A link that was used or is too old does not open any more.').waitFor();
});

it('has signed out every browser that knew the old password', async () => {
  await newcomer.open('/');
  await newcomer.page.getByRole('heading', { level: 1, name: 'Sign in' }).waitFor();
});
