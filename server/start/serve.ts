import { createServer, type Server } from 'node:http';
import type { Knex } from 'knex';
import { pino } from 'pino';
import { addressOf, configOf, defaultPort, type Settings } from '../config.ts';
import { createApp } from '../app.ts';
import { connect } from '../database/connect.ts';
import { migrateToLatest } from '../database/migrate.ts';
import { isPortTaken, listenFrom, listenOn, portsTried } from './ports.ts';
import { adviceFor, StartError } from './steps.mjs';

/** The application, listening. */
interface Running {
  readonly address: string;
  readonly port: number;
  /** Answers what is under way, takes nothing new, and resolves when all connections are closed. */
  stop(): Promise<void>;
}

/** How long requests under way may take to end, ms. */
const drainMs = 8_000;

/** What the database itself says, without the statement that the driver puts before it. */
function inShort(error: unknown): string {
  if (!(error instanceof Error)) return String(error);
  const said = 'sqlMessage' in error ? String(error.sqlMessage) : error.message;
  return said.replace(/\.$/, '');
}

/**
 * Connects and brings the tables up to date.
 * @returns the connections and the names of the migrations that were run
 * @throws {StartError} where the database does not answer or a migration fails
 */
export async function openDatabase(
  url: string,
): Promise<{ readonly knex: Knex; readonly ran: readonly string[] }> {
  const knex = connect(url);
  try {
    await knex.raw('select 1');
  } catch (error) {
    await knex.destroy();
    const { host } = new URL(url);
    throw new StartError(
      `The database at ${host} does not let us in: ${error instanceof Error ? error.message : String(error)}`,
      adviceFor(error) ?? 'Check the account, the password and the database named in DATABASE_URL.',
      error,
    );
  }
  try {
    return { knex, ran: await migrateToLatest(knex) };
  } catch (error) {
    await knex.destroy();
    throw new StartError(
      `The tables could not be brought up to date: ${inShort(error)}.`,
      adviceFor(error) ??
        'The database is as the last migration that succeeded left it; keep a copy before trying again.',
      error,
    );
  }
}

async function listen(server: Server, settings: Settings): Promise<number> {
  const { host, port } = settings;
  try {
    return port === null ? await listenFrom(server, defaultPort, host) : await listenOn(server, port, host);
  } catch (error) {
    if (isPortTaken(error)) {
      throw new StartError(
        port === null
          ? `All ports from ${String(defaultPort)} to ${String(defaultPort + portsTried - 1)} are taken.`
          : `Port ${String(port)} is taken by another program.`,
        'End that program, or set PORT to a free one, such as PORT=8180 npm start.',
        error,
      );
    }
    const text = error instanceof Error ? error.message : String(error);
    throw new StartError(
      `Listening on ${addressOf(host, port ?? defaultPort)} failed: ${text}`,
      /EACCES/.test(text)
        ? 'Ports below 1024 take root’s rights: set PORT to 1024 or more.'
        : 'Set HOST to an address of this machine, such as 127.0.0.1.',
      error,
    );
  }
}

/**
 * Tells early that the port asked for is taken, before the work of a first start.
 * @throws {StartError}
 */
export async function assertPortFree(settings: Settings): Promise<void> {
  if (settings.port === null) return;
  const probe = createServer();
  await listen(probe, settings);
  await stopServer(probe);
}

function stopServer(server: Server): Promise<void> {
  return new Promise((resolve) => {
    const late = setTimeout(() => {
      server.closeAllConnections();
    }, drainMs);
    server.close(() => {
      clearTimeout(late);
      resolve();
    });
    server.closeIdleConnections();
  });
}

/** Starts listening with the application on these connections. */
export async function serve(options: {
  readonly settings: Settings;
  readonly databaseUrl: string;
  readonly authSecret: string;
  readonly knex: Knex;
  /** Null where something else serves the client. */
  readonly clientFolder: string | null;
}): Promise<Running> {
  const { settings, databaseUrl, authSecret, knex, clientFolder } = options;
  const server = createServer();
  const port = await listen(server, settings);
  const config = configOf(settings, { port, databaseUrl, authSecret });
  const logger = pino({ level: settings.logLevel });
  // No request can come in between: the event loop has not turned since the port was taken.
  server.on('request', createApp({ config, knex, logger, clientFolder }));
  return { address: config.publicUrl, port, stop: () => stopServer(server) };
}
