import net from 'node:net';
import { Problem } from './problem.mjs';

export const loopback = '127.0.0.1';
const highestPort = 65_535;

/**
 * Reads a port a person chose.
 * @throws Problem when it is not a whole number from 1 to 65535
 */
export function getChosenPort(text, fallback) {
  if (text === undefined || text === '') return fallback;
  const port = Number(text);
  if (/^\d+$/.test(text) && port >= 1 && port <= highestPort) return port;
  throw new Problem(
    `PORT is "${text}", which is no port. Give a whole number from 1 to ${highestPort}, or leave PORT out.`,
  );
}

function tryListening(port) {
  return new Promise((resolve, reject) => {
    const server = net.createServer();
    server.once('error', reject);
    server.listen({ host: loopback, port, exclusive: true }, () => {
      const { port: taken } = server.address();
      server.close(() => resolve(taken));
    });
  });
}

/**
 * The first free loopback port at or above `first`, leaving out those in `taken`.
 * @throws Problem when the system forbids the port, or none is left
 */
export async function getFreePort(first, taken = []) {
  for (let port = first; port <= highestPort; port += 1) {
    if (taken.includes(port)) continue;
    try {
      return await tryListening(port);
    } catch (error) {
      if (error.code === 'EADDRINUSE') continue;
      throw new Problem(`Port ${port} cannot be used (${error.code}). Choose another one: PORT=4310 npm start`);
    }
  }
  throw new Problem(`No port from ${first} up is free. Choose a lower one: PORT=4310 npm start`);
}

/** A free loopback port of the system's choice. */
export function getRandomPort() {
  return tryListening(0);
}
