import { startThrowaway } from './throwaway.ts';

/** Before the test files that need a database: a throw-away server, unless the run has one already. */
export default async function setupDatabase(): Promise<() => Promise<void>> {
  if (process.env['TEST_DATABASE_URL'] !== undefined) return () => Promise.resolve();
  const server = await startThrowaway();
  process.env['TEST_DATABASE_URL'] = server.url;
  return async () => {
    delete process.env['TEST_DATABASE_URL'];
    await server.remove();
  };
}
