import { createServer } from 'node:http';
import { type AddressInfo } from 'node:net';
import { type Browser, type BrowserContext, chromium, type Page } from 'playwright-core';
import { pino } from 'pino';
import { createApp } from '#server/app.ts';
import { demoEmail } from '#server/start/demo/people.ts';
import { type TestDatabase } from '#tests/database.ts';
import { createDemoDatabase, demoPassword } from './demo-database.ts';
import { type Watch, watch } from './watch.ts';

export type DemoRole = 'owner' | 'designer' | 'builder' | 'technician';

/** The whole application with the demo workshop in a database of its own, and a browser to use it with. */
export interface TestApp {
  readonly origin: string;
  readonly database: TestDatabase;
  /** A page of a fresh browser profile; what goes wrong in it is collected and fails the test at `close`. */
  open(options?: OpenOptions): Promise<Visit>;
  stop(): Promise<void>;
}

export interface OpenOptions {
  readonly width?: number;
  readonly height?: number;
  readonly theme?: 'light' | 'dark';
  readonly touch?: boolean;
  /** Where the application is reached, if not at its own address. */
  readonly origin?: string;
  /** Signs in as this person of the demo workshop: by the sign-in screen at first, then with the session it gave. */
  readonly as?: DemoRole;
}

/** A page with the record of what went wrong on it. */
export interface Visit {
  readonly page: Page;
  readonly watch: Watch;
  /** Another tab of the same browser profile. */
  tab(): Promise<Visit>;
  /** Throws when there were console errors, page errors or failed requests since the profile was opened. */
  check(): void;
  /** Closes the profile, after the same check. */
  close(): Promise<void>;
}

/** Starts the application and the browser; TEST_CHROMIUM and TEST_CLIENT come from the project's set-up. */
export async function startApp(): Promise<TestApp> {
  const database = await createDemoDatabase();
  const server = createServer();
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const origin = `http://127.0.0.1:${String((server.address() as AddressInfo).port)}`;
  server.on(
    'request',
    createApp({
      config: {
        authSecret: 'a secret of tests, long enough to be one',
        publicUrl: origin,
        trustProxy: false,
      },
      knex: database.knex,
      logger: pino({ level: 'silent' }),
      clientFolder: process.env['TEST_CLIENT'] ?? null,
    }),
  );
  const browser = await chromium.launch({
    executablePath: process.env['TEST_CHROMIUM'] ?? '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
    ],
  });
  const sessions: Sessions = new Map();
  return {
    origin,
    database,
    open: (options = {}) => visit(browser, options.origin ?? origin, sessions, options),
    stop: async () => {
      await browser.close();
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
      await database.drop();
    },
  };
}

/** The cookies of those who have signed in, so that not every story pays for hashing a password. */
type Sessions = Map<DemoRole, Awaited<ReturnType<BrowserContext['storageState']>>>;

async function visit(
  browser: Browser,
  origin: string,
  sessions: Sessions,
  options: OpenOptions,
): Promise<Visit> {
  const { width = 1280, height = 800, theme = 'light', touch = false, as } = options;
  const session = as && sessions.get(as);
  const context = await browser.newContext({
    baseURL: origin,
    viewport: { width, height },
    colorScheme: theme,
    hasTouch: touch,
    acceptDownloads: true,
    timezoneId: 'UTC',
    locale: 'en-GB',
    reducedMotion: 'reduce',
    ...(session ? { storageState: session } : {}),
  });
  context.setDefaultTimeout(15_000);
  const watches: Watch[] = [];
  const tab = async (): Promise<Visit> => {
    const page = await context.newPage();
    const watched = watch(page);
    watches.push(watched);
    return { page, watch: watched, tab, check, close };
  };
  const check = () => {
    const wrong = watches.flatMap(({ problems }) => problems());
    if (wrong.length > 0) throw new Error(`On the page:\n${wrong.join('\n')}`);
  };
  const close = async () => {
    await context.close();
    check();
  };
  const first = await tab();
  if (as && session) {
    await openLibrary(first.page, as);
  } else if (as) {
    await signIn(first.page, as);
    sessions.set(as, await context.storageState());
  }
  return first;
}

/** The library as the role sees it. */
async function openLibrary(page: Page, role: DemoRole): Promise<void> {
  await page.goto(role === 'technician' ? '/sections?status=released' : '/sections');
}

/** Signs in by the sign-in screen, waits for the role's own start, and opens the library. */
export async function signIn(page: Page, role: DemoRole): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(demoEmail(role));
  await page.getByLabel('Password', { exact: true }).fill(demoPassword);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => url.pathname === (role === 'technician' ? '/cutting-list' : '/'));
  await openLibrary(page, role);
}
