import type { Browser, BrowserContext, ConsoleMessage, Page } from 'playwright-core';
import { DEMO_PASSWORD } from '../../server/seeders/demoData.ts';

export type DemoName = 'lead' | 'grower' | 'theorist' | 'guest';

export type VisitorOptions = {
  /** Signs in as this demo person before the first page. */
  as?: DemoName;
  theme?: 'light' | 'dark';
  width?: number;
  height?: number;
};

export type Visitor = {
  context: BrowserContext;
  page: Page;
  /** What the browser complained about on any page so far. */
  complaints: string[];
  /** Opens an address of the site and waits until its page stands. */
  open(address: string): Promise<void>;
};

/** How long a page may take on a machine that is busy with other things. */
export const PATIENCE_MS = 20_000;

/** A person in front of a fresh browser profile. */
export async function openVisitor(
  browser: Browser,
  url: string,
  { as, theme = 'light', width = 1280, height = 900 }: VisitorOptions,
): Promise<Visitor> {
  const context = await browser.newContext({
    baseURL: url,
    colorScheme: theme,
    viewport: { width, height },
    locale: 'en-GB',
    timezoneId: 'UTC',
    reducedMotion: 'reduce',
  });
  context.setDefaultTimeout(PATIENCE_MS);
  if (as) {
    const answer = await context.request.post('/api/v1/session', {
      data: { email: `${as}@northgate.example`, password: DEMO_PASSWORD },
    });
    if (!answer.ok()) throw new Error(`${as} cannot sign in: ${await answer.text()}`);
  }
  const complaints: string[] = [];
  context.on('console', (message) => {
    if (message.type() === 'error' && !isSignedOutAnswer(message)) complaints.push(message.text());
  });
  context.on('weberror', (error) => complaints.push(error.error().message));
  const page = await context.newPage();
  return {
    context,
    page,
    complaints,
    open: async (address) => {
      await page.goto(address);
      await page.getByRole('heading', { level: 1 }).waitFor();
    },
  };
}

/** The client asks who is signed in; "nobody" is a 401, which Chromium writes to the console by itself. */
function isSignedOutAnswer(message: ConsoleMessage): boolean {
  return message.text().includes('401') && message.location().url.endsWith('/api/v1/session');
}
