import net from 'node:net';

/**
 * A port of the loopback address that nobody listens on at this moment.
 * @returns {Promise<number>}
 */
export function freePort() {
  return new Promise((resolve, reject) => {
    const server = net.createServer();
    server.on('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const { port } = server.address();
      server.close(() => resolve(port));
    });
  });
}

/**
 * Whether a server could listen on this port of every address now.
 * @param {number} port
 * @returns {Promise<boolean>}
 */
export function isFree(port) {
  return new Promise((resolve) => {
    const server = net.createServer();
    server.on('error', () => resolve(false));
    server.listen(port, () => server.close(() => resolve(true)));
  });
}

/**
 * Whether a MariaDB greets on this loopback port (its first packet carries protocol version 10).
 * @param {number} port
 * @returns {Promise<boolean>}
 */
export function greets(port, timeoutMs = 1000) {
  return new Promise((resolve) => {
    const socket = net.connect({ host: '127.0.0.1', port });
    const end = (answer) => {
      socket.destroy();
      resolve(answer);
    };
    socket.setTimeout(timeoutMs, () => end(false));
    socket.on('error', () => end(false));
    socket.on('close', () => end(false));
    socket.once('data', (packet) => end(packet.length > 5 && packet[4] === 10));
  });
}
