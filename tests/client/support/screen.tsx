import { QueryClientProvider } from '@tanstack/react-query';
import { cleanup, configure, render } from '@testing-library/react';
import { type ReactNode, Suspense } from 'react';
import { createMemoryRouter, RouterProvider } from 'react-router';
import { afterEach, beforeEach, vi } from 'vitest';
import { meQuery } from '#client/api/me.ts';
import { createQueryClient } from '#client/app/query-client.ts';
import { routesOf } from '#client/router.tsx';
import { type Me } from '#server/contracts/people.ts';
import { personOf } from './samples.ts';
// Read before the first test, so that no test waits for a screen's file to be read.
import '#client/account/account-page.tsx';
import '#client/account/sign-in-page.tsx';
import '#client/app/shell.tsx';
import '#client/desk/desk-page.tsx';
import '#client/sections/library/library-page.tsx';
import '#client/sections/library/new-section-dialog.tsx';

configure({ asyncUtilTimeout: 5000 });

/** What jsdom lacks: modal dialogs and media queries. Call once at the top of a test file. */
export function useBrowserParts({ wide = true }: { wide?: boolean } = {}): void {
  beforeEach(() => {
    Object.assign(HTMLDialogElement.prototype, {
      showModal(this: HTMLDialogElement) {
        this.open = true;
      },
      close(this: HTMLDialogElement) {
        this.open = false;
      },
    });
    vi.stubGlobal('matchMedia', (query: string) => ({
      matches: wide && query.includes('min-width'),
      addEventListener: () => undefined,
      removeEventListener: () => undefined,
    }));
    vi.stubGlobal('scrollTo', () => undefined);
  });
  afterEach(() => {
    cleanup();
    vi.unstubAllGlobals();
    localStorage.clear();
  });
}

/** The whole program at an address, as the browser runs it, with answers of a fake server. */
export function openAt(address: string) {
  const client = createQueryClient();
  client.setDefaultOptions({ queries: { ...client.getDefaultOptions().queries, retryDelay: 1 } });
  const router = createMemoryRouter(routesOf(client), { initialEntries: [address] });
  const view = render(
    <QueryClientProvider client={client}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
  return {
    ...view,
    router,
    client,
    address: () => `${router.state.location.pathname}${router.state.location.search}`,
  };
}

/** One control of a signed-in person. */
export function renderFor(control: ReactNode, me: Me = personOf('designer')) {
  const client = createQueryClient();
  client.setQueryData(meQuery().queryKey, me);
  const wrap = (inner: ReactNode) => (
    <QueryClientProvider client={client}>
      <Suspense>{inner}</Suspense>
    </QueryClientProvider>
  );
  const view = render(wrap(control));
  return {
    ...view,
    show: (next: ReactNode) => {
      view.rerender(wrap(next));
    },
  };
}
