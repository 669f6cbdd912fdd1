import { once } from 'node:events';
import { createServer, type Server } from 'node:net';
import { anyFreePort, DEFAULT_PORT, isPortFree, portFrom, readPort } from '../../scripts/free-port';

describe('the port of a start', () => {
  const open: Server[] = [];

  const listenOn = async (port: number, host: string): Promise<void> => {
    const server = createServer().listen(port, host);
    open.push(server);
    await once(server, 'listening');
  };

  afterEach(async () => {
    for (const server of open.splice(0)) await new Promise((resolve) => server.close(resolve));
  });

  it.each([
    [undefined, DEFAULT_PORT],
    ['', DEFAULT_PORT],
    ['8080', 8080],
    [' 65535 ', 65535],
    ['65536', undefined],
    ['0', undefined],
    ['-1', undefined],
    ['80.5', undefined],
    ['http', undefined],
    ['1e3', undefined],
  ])('reads PORT=%j as %j', (text, port) => {
    expect(readPort(text)).toBe(port);
  });

  it('is the one wanted when that is free', async () => {
    expect(await portFrom(5000, async () => true)).toBe(5000);
  });

  it('is the next free one when the wanted one is taken', async () => {
    expect(await portFrom(5000, async (port) => port >= 5003)).toBe(5003);
  });

  it('is refused when none of the next hundred is free, and never beyond the last port there is', async () => {
    const asked: number[] = [];
    const none = async (port: number): Promise<boolean> => {
      asked.push(port);
      return false;
    };
    await expect(portFrom(65530, none)).rejects.toThrow('65535');
    expect(Math.max(...asked)).toBe(65535);
  });

  it('is not one that another program listens on', async () => {
    const port = await anyFreePort();
    expect(await isPortFree(port)).toBe(true);
    await listenOn(port, '127.0.0.1');
    expect(await isPortFree(port)).toBe(false);
  });

  it('is not one that another program has on the other loopback address, which localhost may mean', async () => {
    const port = await anyFreePort();
    await listenOn(port, '::1');
    expect(await isPortFree(port)).toBe(false);
  });
});
