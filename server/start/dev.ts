import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { join, relative } from 'node:path';
import { type ViteDevServer } from 'vite';
import { defaultPort } from '../config.ts';
import { clientServer } from './client-server.ts';
import { freePort } from './ports.ts';
import { greet, prepare, type Launch } from './prepare.ts';
import { tied } from './processes.mjs';
import { onStop, type Stops } from './stop.ts';

/** The folders whose change restarts the server. */
const serverFolders = ['server', 'geometry', 'migrations'];

function isReady(child: ChildProcess): Promise<unknown> {
  return Promise.race([once(child, 'message'), once(child, 'exit')]);
}

/** The application in a process of its own, replaced when its sources change; the database stays up. */
class AppProcess {
  #child: ChildProcess | undefined;
  #change: Promise<void> = Promise.resolve();
  #environment: NodeJS.ProcessEnv = {};

  constructor(
    private readonly root: string,
    readonly port: number,
  ) {}

  /** Starts with these settings, for this and every later start. */
  start(environment: NodeJS.ProcessEnv): Promise<void> {
    this.#environment = environment;
    return this.restart();
  }

  /** Resolves when no restart is under way. */
  settled(): Promise<void> {
    return this.#change;
  }

  async #stop(): Promise<void> {
    const child = this.#child;
    this.#child = undefined;
    if (child === undefined || child.exitCode !== null || child.signalCode !== null) return;
    child.kill('SIGTERM');
    await once(child, 'exit');
  }

  async #start(): Promise<void> {
    this.#child = spawn(...tied(process.execPath, ['--import', 'tsx', 'server/main.ts']), {
      cwd: this.root,
      env: this.#environment,
      stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
      detached: true,
    });
    await isReady(this.#child);
  }

  restart(): Promise<void> {
    this.#change = this.#change.then(() => this.#stop()).then(() => this.#start());
    return this.#change;
  }

  stop(): Promise<void> {
    this.#change = this.#change.then(() => this.#stop());
    return this.#change;
  }
}

function restartOnChange(vite: ViteDevServer, root: string, app: AppProcess): void {
  vite.watcher.add(serverFolders.map((folder) => join(root, folder)));
  let timer: NodeJS.Timeout | undefined;
  vite.watcher.on('all', (_event, path) => {
    const [folder = ''] = relative(root, path).split('/');
    if (!serverFolders.includes(folder)) return;
    clearTimeout(timer);
    timer = setTimeout(() => {
      console.log(`- ${relative(root, path)} changed: restarting the server`);
      void app.restart();
    }, 100);
  });
}

/** `npm run dev`: the client through Vite with replacement of changed modules, the server restarted on change. */
export default function dev(launch: Launch): Promise<void> {
  const stops = onStop();
  return stops.guard(() => startAll(launch, stops));
}

async function startAll(launch: Launch, stops: Stops): Promise<void> {
  const { root, environment } = launch;
  const { settings, databaseUrl, authSecret, knex, demoPassword, announce } = await prepare(launch, stops);
  await knex.destroy();
  const app = new AppProcess(root, await freePort());
  const target = `http://127.0.0.1:${String(app.port)}`;
  const vite = await clientServer({
    root,
    target,
    host: settings.host,
    port: settings.port ?? defaultPort,
    strictPort: settings.port !== null,
    ready: () => app.settled(),
  });
  await vite.listen();
  stops.add(() => vite.close());
  const address = vite.resolvedUrls?.local[0]?.replace(/\/$/, '') ?? vite.resolvedUrls?.network[0] ?? target;
  stops.add(() => app.stop());
  await app.start({
    ...environment,
    HOST: '127.0.0.1',
    PORT: String(app.port),
    DATABASE_URL: databaseUrl,
    AUTH_SECRET: authSecret,
    PUBLIC_URL: settings.publicUrl ?? address,
    DEMO: settings.demo ? '1' : '0',
  });
  restartOnChange(vite, root, app);
  announce(address);
  greet(address, launch.begun, demoPassword);
}
