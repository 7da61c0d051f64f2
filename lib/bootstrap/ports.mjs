import net from 'node:net';
import { Trouble } from './trouble.mjs';

function tryPort(port) {
  return new Promise((resolve, reject) => {
    const server = net.createServer();
    server.once('error', reject);
    server.listen({ host: '127.0.0.1', port, exclusive: true }, () => {
      const taken = server.address().port;
      server.close(() => resolve(taken));
    });
  });
}

/** A port on loopback that nobody listens on just now. */
export const freePort = () => tryPort(0);

/** The port PORT asks for, seen to be free. */
export async function requirePort(text = process.env.PORT || '3000') {
  const port = Number(text);
  if (!/^\d+$/.test(text) || port < 1 || port > 65535) {
    throw new Trouble(`PORT is "${text}".`, 'It must be a whole number from 1 to 65535, as in: PORT=3001 npm start');
  }
  try {
    return await tryPort(port);
  } catch (error) {
    if (error.code === 'EACCES') {
      throw new Trouble(
        `Port ${port} is not open to this user.`,
        'Choose one from 1024 up, as in: PORT=3001 npm start',
      );
    }
    if (error.code !== 'EADDRINUSE') throw error;
    throw new Trouble(
      `Port ${port} is taken by another program.`,
      `Stop that program, or choose another port, as in: PORT=${port < 65535 ? port + 1 : 3001} npm start`,
    );
  }
}
