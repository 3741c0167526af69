import { createServer } from 'node:net';

/** The wanted port of the loopback address, or the next one that is free. */
export async function freePort(wanted) {
  const last = Math.min(wanted + 49, 65535);
  for (let port = wanted; port <= last; port++) if (await isFree(port)) return port;
  throw new Error(`No port from ${wanted} to ${last} is free.`);
}

/** A port as it is written in a setting. */
export function readPort(text) {
  const port = Number(text);
  if (!Number.isInteger(port) || port < 1 || port > 65535)
    throw new Error(`PORT is ${text}; a port is a whole number from 1 to 65535.`);
  return port;
}

function isFree(port) {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', () => resolve(false));
    server.listen(port, '127.0.0.1', () => server.close(() => resolve(true)));
  });
}
