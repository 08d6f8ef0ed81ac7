import { createServer } from 'node:net';
import { PlainFailure } from './plain-failure.mjs';

/** A port on 127.0.0.1 that nobody listens on right now. */
export function freePort() {
  return listenBriefly('127.0.0.1', 0);
}

/**
 * @param wanted  the port as the environment gives it; 0 takes any free one.
 * @returns the port's number.
 * @throws {PlainFailure} when the port cannot be had.
 */
export async function requirePort(host, wanted) {
  const port = Number(wanted);
  if (!Number.isInteger(port) || port < 0 || port > 65_535) {
    throw new PlainFailure(`PORT must be a number from 0 to 65535; found "${wanted}".`);
  }
  try {
    return await listenBriefly(host, port);
  } catch (error) {
    if (error.code === 'EADDRINUSE') {
      throw new PlainFailure(
        `Port ${port} on ${host} is taken: stop what uses it, or set PORT to another number.`,
      );
    }
    if (error.code === 'EACCES') {
      throw new PlainFailure(
        `This user may not listen on port ${port}: set PORT to 1024 or above.`,
      );
    }
    throw error;
  }
}

function listenBriefly(host, port) {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', reject);
    server.listen(port, host, () => {
      const bound = server.address().port;
      server.close(() => resolve(bound));
    });
  });
}
