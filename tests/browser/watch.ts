import { type Page } from 'playwright-core';

/** A refusal of the server that a story is about, or that the screens ask for and take for an answer. */
interface Expected {
  readonly method: string;
  readonly path: RegExp;
  readonly status: number;
}

/** No session yet, and no unsaved work: both are questions that may be answered by no. */
const ALWAYS: readonly Expected[] = [
  { method: 'GET', path: /^\/api\/me$/, status: 401 },
  { method: 'GET', path: /^\/api\/(sections|cut-sheets)\/[^/]+\/draft$/, status: 404 },
];

/** What went wrong on a page. */
export interface Watch {
  /** Lets one kind of refusal pass on this page. */
  expectRefusal(method: string, path: RegExp, status: number): void;
  /** Lets requests fail without an answer, for stories about a broken network. */
  expectOffline(): void;
  problems(): readonly string[];
}

/** Collects console errors and warnings, uncaught errors, refused and failed requests. */
export function watch(page: Page): Watch {
  const expected: Expected[] = [...ALWAYS];
  const seen: string[] = [];
  let offline = false;
  page.on('console', (message) => {
    // Chromium repeats each refused or failed request here without saying which; those are watched below.
    if (message.text().startsWith('Failed to load resource')) return;
    if (['error', 'warning'].includes(message.type()))
      seen.push(`console ${message.type()}: ${message.text()}`);
  });
  page.on('pageerror', (error) => seen.push(`uncaught: ${error.message}`));
  page.on('response', (response) => {
    const method = response.request().method();
    const { pathname } = new URL(response.url());
    const status = response.status();
    if (status < 400) return;
    if (expected.some((one) => one.method === method && one.status === status && one.path.test(pathname)))
      return;
    seen.push(`${method} ${pathname} answered ${String(status)}`);
  });
  page.on('requestfailed', (request) => {
    const reason = request.failure()?.errorText ?? '';
    // The screens call off what they no longer need, and a closing tab what it had asked for.
    if (reason === 'net::ERR_ABORTED' || offline) return;
    seen.push(`${request.method()} ${request.url()} failed: ${reason}`);
  });
  return {
    expectRefusal: (method, path, status) => {
      expected.push({ method, path, status });
    },
    expectOffline: () => {
      offline = true;
    },
    problems: () => seen,
  };
}
