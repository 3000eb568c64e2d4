import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render } from '@testing-library/react';
import { type ReactNode, Suspense } from 'react';
import { MemoryRouter } from 'react-router';
import { afterEach, vi } from 'vitest';
import { meQuery } from '#client/api/me.ts';
import { Announcer } from '#client/ui/announcer.tsx';
import { type Me } from '#server/contracts/people.ts';
import { type Section, type SectionVersion } from '#server/contracts/sections.ts';

export const sectionId = '0197a000-0000-7000-8000-000000000001';
const author = { id: '0197a000-0000-7000-8000-0000000000a1', name: 'Ines Aldam' };

export function versionOf(number: number, changes: Partial<SectionVersion> = {}): SectionVersion {
  return {
    id: `0197a000-0000-7000-8000-${String(number).padStart(12, '0')}`,
    sectionId,
    sectionName: 'Heron outer panel',
    number,
    basedOn: number === 1 ? null : number - 1,
    status: 'draft',
    statusReason: '',
    statusBy: null,
    statusAt: null,
    shape: {
      kind: 'naca4',
      maxCamber: 0.02,
      maxCamberPosition: 0.4,
      maxThickness: 0.12,
      trailingEdge: 'open',
    },
    description: 'NACA 2412',
    checksum: 'ab'.repeat(32),
    note: `Note of version ${number}`,
    author,
    createdAt: `2026-11-0${Math.min(number, 9)}T09:00:00.000Z`,
    ...changes,
  };
}

export const releasedBy = { statusBy: author, statusAt: '2026-11-12T10:00:00.000Z' };

export function sectionOf(changes: Partial<Section> = {}): Section {
  const { number, status, description, shape } = versionOf(3, { status: 'released' });
  return {
    id: sectionId,
    name: 'Heron outer panel',
    purpose: '',
    archived: false,
    createdAt: '2026-11-01T09:00:00.000Z',
    updatedAt: '2026-11-03T09:00:00.000Z',
    updatedBy: author,
    versionCount: 3,
    releasedNumber: 3,
    latest: { number, status, description, maxThickness: 0.12, maxCamber: 0.02, shape },
    ...changes,
  };
}

export function meOf(role: Me['role'], units: Me['preferences']['units'] = 'mm'): Me {
  return {
    id: author.id,
    name: author.name,
    email: `${role}@marrowfen.example`,
    role,
    workshop: { id: '0197a000-0000-7000-8000-0000000000f1', name: 'Marrow Fen Works' },
    preferences: { units, theme: 'day' },
  };
}

type Answer = Response | Promise<Response>;
type Answers = Readonly<Record<string, (url: URL, init: RequestInit) => Answer>>;

export function json(value: unknown, status = 200): Response {
  return new Response(JSON.stringify(value), { status, headers: { 'content-type': 'application/json' } });
}

export function problem(
  status: number,
  title: string,
  errors?: { path: string; message: string }[],
): Response {
  return json({ type: 'about:blank', title, status, code: 'test', errors }, status);
}

/** Stands in for the server: answers by "METHOD /path"; returns the requests as they came. */
export function fakeServer(answers: Answers) {
  const requests: { method: string; url: URL; body: unknown }[] = [];
  vi.stubGlobal('fetch', async (address: string, init: RequestInit = {}) => {
    const url = new URL(address, 'http://test.example');
    const method = init.method ?? 'GET';
    requests.push({ method, url, body: typeof init.body === 'string' ? JSON.parse(init.body) : null });
    const answer = answers[`${method} ${url.pathname}`];
    return answer ? await answer(url, init) : problem(404, `Nothing at ${method} ${url.pathname}`);
  });
  return requests;
}

export function show(node: ReactNode, { me = meOf('designer'), at = '/' }: { me?: Me; at?: string } = {}) {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false, networkMode: 'always' } } });
  client.setQueryData(meQuery().queryKey, me);
  return render(
    <QueryClientProvider client={client}>
      <MemoryRouter initialEntries={[at]}>
        <Announcer>
          <Suspense>{node}</Suspense>
        </Announcer>
      </MemoryRouter>
    </QueryClientProvider>,
  );
}

/** jsdom knows the dialog element but cannot open it. */
HTMLDialogElement.prototype.showModal = function showModal() {
  this.open = true;
};
HTMLDialogElement.prototype.close = function close() {
  this.open = false;
};

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});
