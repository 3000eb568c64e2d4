import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type AccountRole } from '#server/account/person.ts';
import { type Endpoint } from '#server/contracts/endpoint.ts';
import { type EndpointName, endpoints } from '#server/contracts/endpoints.ts';
import { accountRoles, may, permissions, roles } from '#server/contracts/permissions.ts';
import { startApi, type TestApi, type TestWorkshop } from './support/api.ts';
import { type Client } from './support/client.ts';
import { makeSamples, requests, type Samples } from './support/requests.ts';
import { cheapWorks } from './support/sheets.ts';

const names = Object.keys(endpoints) as EndpointName[];

function changes({ method }: Endpoint): boolean {
  return method !== 'GET';
}

/** What an allowed request is answered with; a wrong present password is refused, but as a value. */
function successOf(name: EndpointName): number {
  const endpoint: Endpoint = endpoints[name];
  if (name === 'changePassword') return 422;
  return endpoint.status ?? (endpoint.reply === null ? 204 : 200);
}

describe('the table of permissions', () => {
  it('says who may do what, role by role', () => {
    const table = Object.fromEntries(
      roles.map((role) => [
        role,
        (Object.keys(permissions) as (keyof typeof permissions)[]).filter((permission) =>
          may(role, permission),
        ),
      ]),
    );
    const reads = ['account.own', 'released.read', 'sections.read'];
    const all = [...reads, 'sections.write', 'versions.release', 'files.download', 'downloads.read'];
    const sheets = ['cut-sheets.read', 'cut-sheets.write', 'cut-sheets.release'];
    const floor = ['cuts.log', 'inspections.write'];
    const cutting = [...sheets, ...floor, 'inspections.answer', 'shop.read'];
    const flight = ['flight-conditions.read', 'flight-conditions.write'];
    expect(table).toEqual({
      owner: [...all, ...cutting, 'shop.write', ...flight],
      designer: [...all, ...cutting, ...flight],
      builder: [
        ...reads,
        'files.download',
        'downloads.read',
        ...cutting,
        'shop.write',
        'flight-conditions.read',
      ],
      technician: [
        'account.own',
        'released.read',
        'files.download',
        ...floor,
        'shop.read',
        'flight-conditions.read',
      ],
      guest: [],
    });
  });

  it('leaves only the health of the service to everybody', () => {
    expect(names.filter((name) => endpoints[name].permission === 'public')).toEqual(['health']);
  });
});

describe('every endpoint for every role', () => {
  let api: TestApi;
  let workshop: TestWorkshop;
  const clients = new Map<AccountRole | 'nobody', Client>();
  /** For those who are refused, who can change nothing of them. */
  let shared: Samples;

  beforeAll(async () => {
    api = await startApi({ works: cheapWorks });
    workshop = await api.addWorkshop('marsh');
    shared = await makeSamples(api, workshop);
    clients.set('nobody', api.anonymous());
    for (const role of accountRoles) clients.set(role, await api.signIn(workshop, role));
  });
  afterAll(() => api.close());

  const cases = names.flatMap((name) =>
    (['nobody', ...accountRoles] as const).map((role) => [name, role] as const),
  );
  it.each(cases)('%s as %s', async (name, role) => {
    const { permission }: Endpoint = endpoints[name];
    const isAllowed = permission === 'public' || (role !== 'nobody' && may(role, permission));
    const samples = isAllowed && changes(endpoints[name]) ? await makeSamples(api, workshop) : shared;
    const answer = await clients.get(role)!.call(name, requests[name](samples));
    const refused = role === 'nobody' ? 401 : 403;
    expect(answer.status).toBe(isAllowed ? successOf(name) : refused);
    if (!isAllowed) expect(answer.problem.code).toBe(role === 'nobody' ? 'unauthenticated' : 'forbidden');
    expect(api.errors).toEqual([]);
  });

  it('refuses before it reads the body or looks for the section', async () => {
    const technician = clients.get('technician')!;
    const answer = await technician.call('saveVersion', {
      params: { sectionId: '0190a5b0-1111-7222-8333-444455556666' },
      body: { nonsense: true },
    });
    expect(answer.status).toBe(403);
    const nobody = await api.anonymous().fetch('/api/sections', { method: 'POST', body: 'no json' });
    expect(nobody.status).toBe(401);
  });
});
