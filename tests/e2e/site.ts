import { chromium } from 'playwright-core';
import type { Browser } from 'playwright-core';
import { startBuiltServer } from './builtServer.ts';
import { openVisitor } from './visitor.ts';
import type { Visitor, VisitorOptions } from './visitor.ts';

export type Site = {
  url: string;
  /** A fresh browser profile: no cookies, nothing stored. */
  visit(options?: VisitorOptions): Promise<Visitor>;
  stop(): Promise<void>;
};

/** What Chromium needs to run as root in a container, and to ask nobody outside. */
const CHROMIUM_FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/**
 * The whole application with the demo data, and a browser to visit it with.
 *
 * @throws Error when it is not built, does not start, or there is no throw-away database
 */
export async function startSite(): Promise<Site> {
  const databaseUrl = process.env['TEST_DATABASE_URL'];
  if (!databaseUrl) throw new Error('TEST_DATABASE_URL is not set: "npm test -- e2e" makes a database.');
  const [server, browser] = await Promise.all([startBuiltServer(databaseUrl), launchBrowser()]);
  return {
    url: server.url,
    visit: (options = {}) => openVisitor(browser, server.url, options),
    async stop() {
      await browser.close();
      await server.stop();
    },
  };
}

function launchBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: process.env['CHROMIUM_PATH'] ?? '/usr/bin/chromium',
    args: CHROMIUM_FLAGS,
  });
}
