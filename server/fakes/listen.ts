import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { Express } from 'express';

export interface RunningFake {
  /** Base address without a slash at its end. */
  url: string;
  close(): Promise<void>;
}

/** Listens on loopback; port 0 takes a free one. */
export async function listenOnLoopback(app: Express, port: number): Promise<RunningFake> {
  const server = await new Promise<Server>((resolve, reject) => {
    const starting = app.listen(port, '127.0.0.1', (error?: Error) => (error === undefined ? resolve(starting) : reject(error)));
  });
  const { port: taken } = server.address() as AddressInfo;
  return {
    url: `http://127.0.0.1:${taken}`,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}
