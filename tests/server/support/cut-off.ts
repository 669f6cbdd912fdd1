import { createServer, connect, type AddressInfo, type Socket } from 'node:net';

/** A way to a database that can be cut and mended: bytes pass unchanged, so both ends speak their own protocol. */
export interface CutOff {
  /** The database's URL by this way. */
  url: string;
  /** Breaks every connection and refuses new ones. */
  cut(): Promise<void>;
  mend(): Promise<void>;
  close(): Promise<void>;
}

export async function throughCutOff(databaseUrl: string): Promise<CutOff> {
  const target = new URL(databaseUrl);
  const sockets = new Set<Socket>();
  const accept = (client: Socket): void => {
    const server = connect(Number(target.port), target.hostname);
    for (const [one, other] of [
      [client, server],
      [server, client],
    ] as const) {
      sockets.add(one);
      one.pipe(other);
      // Either end going away, in order or not, takes the other along.
      one.on('error', () => other.destroy());
      one.on('close', () => {
        sockets.delete(one);
        other.destroy();
      });
    }
  };
  let proxy = createServer(accept);
  await listen(proxy, 0);
  const { port } = proxy.address() as AddressInfo; // listening on TCP
  const stop = async (): Promise<void> => {
    const closed = new Promise((resolve) => proxy.close(resolve));
    for (const socket of sockets) socket.destroy();
    await closed;
  };
  const url = new URL(databaseUrl);
  url.port = String(port);
  return {
    url: url.href,
    cut: stop,
    mend: async () => {
      proxy = createServer(accept);
      await listen(proxy, port);
    },
    close: async () => {
      if (proxy.listening) await stop();
    },
  };
}

function listen(server: ReturnType<typeof createServer>, port: number): Promise<void> {
  return new Promise((resolve) => {
    server.listen(port, '127.0.0.1', resolve);
  });
}
