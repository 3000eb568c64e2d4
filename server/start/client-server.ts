import { statSync } from 'node:fs';
import { join } from 'node:path';
import { createServer, type Plugin, type ProxyOptions, type ViteDevServer } from 'vite';

/** What the application answers, the client's own files apart. */
const applicationPath = /^\/(api|auth)\//;

/**
 * Whether an address names a file of the client, such as client/api/me.ts at /api/me.ts: Vite serves the client's folder
 * at the root, where the application has its addresses too.
 */
export function isClientFile(clientFolder: string, url: string): boolean {
  const path = /^[^?#]*/.exec(url)?.[0] ?? '';
  if (path.includes('%') || path.split('/').includes('..')) return false;
  return statSync(join(clientFolder, path), { throwIfNoEntry: false })?.isFile() ?? false;
}

/** Lets requests wait until the application can answer, instead of failing. */
function holdBack(isForApplication: (url: string) => boolean, ready: () => Promise<void>): Plugin {
  return {
    name: 'hold-back-during-restart',
    configureServer: ({ middlewares }) => {
      middlewares.use((request, _response, next) => {
        if (!isForApplication(request.url ?? '')) next();
        else void ready().then(() => next());
      });
    },
  };
}

/** The client through Vite, for development, with all else passed on to the application. Does not listen yet. */
export function clientServer(options: {
  /** The checkout. */
  readonly root: string;
  /** Address of the application. */
  readonly target: string;
  readonly host: string;
  readonly port: number;
  /** Whether no other port will do. */
  readonly strictPort: boolean;
  /** Resolves when the application can answer. */
  readonly ready: () => Promise<void>;
  /** Where the packages made ready for the browser are kept, in the checkout. */
  readonly cacheFolder?: string;
}): Promise<ViteDevServer> {
  const { root, target, host, port, strictPort, ready, cacheFolder = '.build/vite' } = options;
  const isOwn = (url: string): boolean => isClientFile(join(root, 'client'), url);
  const passOn: ProxyOptions = {
    target,
    bypass: ({ url = '' }) => (isOwn(url) ? url : undefined),
  };
  return createServer({
    configFile: join(root, 'vite.config.ts'),
    cacheDir: join(root, cacheFolder),
    plugins: [holdBack((url) => applicationPath.test(url) && !isOwn(url), ready)],
    server: { host, port, strictPort, proxy: { '/api/': passOn, '/auth/': passOn } },
  });
}
