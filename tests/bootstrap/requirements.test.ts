import { once } from 'node:events';
import net from 'node:net';
import { describe, expect, test } from 'vitest';
import { dependenciesInstalled, requireNode } from '@/lib/bootstrap/dependencies.mjs';
import { freePort, requirePort } from '@/lib/bootstrap/ports.mjs';

describe('what a start needs', () => {
  test.each(['18.20.4', '20.8.1', '16.0.0'])('Node %s is refused', (version) => {
    expect(() => requireNode(version)).toThrow(`Node ${version} is too old.`);
  });

  test.each(['20.9.0', '20.20.2', '22.1.0', '24.0.0'])('Node %s is taken', (version) => {
    expect(requireNode(version)).toBeUndefined();
  });

  test('the packages of the lock file are installed', () => {
    expect(dependenciesInstalled()).toBe(true);
  });

  test.each(['0', '65536', 'http', '-1', '3000.5'])('PORT=%s is refused', async (port) => {
    await expect(requirePort(port)).rejects.toMatchObject({
      message: `PORT is "${port}".`,
      remedy: 'It must be a whole number from 1 to 65535, as in: PORT=3001 npm start',
    });
  });

  test('a port that is taken is refused, with another one to try', async () => {
    const port = await freePort();
    const other = net.createServer().listen(port, '127.0.0.1');
    await once(other, 'listening');
    await expect(requirePort(String(port))).rejects.toMatchObject({
      message: `Port ${port} is taken by another program.`,
      remedy: `Stop that program, or choose another port, as in: PORT=${port + 1} npm start`,
    });
    other.close();
    await once(other, 'close');
    expect(await requirePort(String(port))).toBe(port);
  });
});
