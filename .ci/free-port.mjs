import { createServer } from 'node:net';

/** The wanted port of the loopback address, or the next one that is free. */
export async function freePort(wanted) {
  for (let port = wanted; port < wanted + 50; port++) if (await isFree(port)) return port;
  throw new Error(`No port from ${wanted} to ${wanted + 49} is free.`);
}

export function isFree(port) {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', () => resolve(false));
    server.listen(port, '127.0.0.1', () => server.close(() => resolve(true)));
  });
}
