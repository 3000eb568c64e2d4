import { createServer, type AddressInfo, type Server } from 'node:net';

/** Listens, or rejects with the error; EADDRINUSE where the port is taken. */
export function listenOn(server: Server, port: number, host: string): Promise<number> {
  return new Promise((resolve, reject) => {
    const fail = (error: Error): void => {
      reject(error);
    };
    server.once('error', fail);
    server.listen({ port, host, exclusive: true }, () => {
      server.off('error', fail);
      resolve((server.address() as AddressInfo).port);
    });
  });
}

/** A port of this machine's loopback that is free now. */
export async function freePort(): Promise<number> {
  const server = createServer();
  const port = await listenOn(server, 0, '127.0.0.1');
  await new Promise((resolve) => server.close(resolve));
  return port;
}

/** Whether listening failed because another holds the port. */
export function isPortTaken(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === 'EADDRINUSE';
}

/** How many ports are tried, one above the other. */
export const portsTried = 100;

/** Listens on the first free port from `first` upwards, within a hundred. */
export async function listenFrom(server: Server, first: number, host: string): Promise<number> {
  for (let port = first; ; port += 1) {
    try {
      return await listenOn(server, port, host);
    } catch (error) {
      if (!isPortTaken(error) || port >= Math.min(first + portsTried - 1, 65_535)) throw error;
    }
  }
}
