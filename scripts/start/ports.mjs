import { connect, createServer } from 'node:net';

/**
 * A TCP port on `host` that nothing listens on at this moment; `preferred` when that one is free.
 * @param {number} [preferred]
 * @param {string} [host]
 * @returns {Promise<number>}
 */
export async function freePort(preferred = 0, host = '127.0.0.1') {
  if (preferred > 0 && (await portState(preferred, host)) === 'free') return preferred;
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', reject);
    server.listen(0, host, () => {
      const { port } = server.address();
      server.close(() => resolve(port));
    });
  });
}

/**
 * @param {number} port
 * @param {string} [host]
 * @returns {Promise<'free' | 'taken' | 'forbidden' | 'no such host'>}
 */
export function portState(port, host = '127.0.0.1') {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', (error) => {
      if (error.code === 'EADDRINUSE') resolve('taken');
      else if (error.code === 'EACCES') resolve('forbidden');
      else if (['EADDRNOTAVAIL', 'ENOTFOUND', 'EAI_AGAIN'].includes(error.code)) resolve('no such host');
      else reject(error);
    });
    server.listen(port, host, () => server.close(() => resolve('free')));
  });
}

/**
 * Whether a MariaDB server greets on this address. The greeting is the first packet of its protocol and needs no password;
 * the server sends it only once it takes connections (after recovery and its first statements), which makes it a true sign of readiness.
 * @param {number} port
 * @param {string} [host]
 * @param {number} [waitMs] for a greeting on an open connection
 * @returns {Promise<boolean>}
 */
export function greets(port, host = '127.0.0.1', waitMs = 5_000) {
  return new Promise((resolve) => {
    const socket = connect({ port, host });
    const end = (answer) => {
      socket.destroy();
      resolve(answer);
    };
    let received = Buffer.alloc(0);
    socket.setTimeout(waitMs, () => end(false));
    socket.once('error', () => end(false));
    socket.once('close', () => end(false));
    socket.on('data', (chunk) => {
      received = Buffer.concat([received, chunk]);
      if (received.length > 4) end(isGreeting(received));
    });
  });
}

/**
 * Byte 4 is the protocol version, 10 since 1998; an error packet has 255 there.
 * @param {Uint8Array} bytes
 */
export function isGreeting(bytes) {
  return bytes.length > 4 && bytes[4] === 10;
}
