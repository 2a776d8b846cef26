import { createServer, request, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { limitRequestTime } from '../../../server/request-time-limit.ts';

const LIMIT_MILLISECONDS = 150;

let server: Server;

beforeAll(async () => {
  server = createServer((incoming, response) => {
    incoming.on('end', () => response.end('whole')).resume();
  });
  server.prependListener('request', (incoming) => limitRequestTime(incoming, LIMIT_MILLISECONDS));
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
});

afterAll(() => {
  server.closeAllConnections();
  server.close();
});

/** Sends one byte every 50 ms and tells how it ended: 'cut', or with the answer's status. */
async function drip(contentType: string, bytes: number): Promise<number | 'cut'> {
  const { port } = server.address() as AddressInfo;
  const outgoing = request({
    port,
    host: '127.0.0.1',
    method: 'POST',
    headers: { 'Content-Type': contentType, 'Content-Length': bytes },
  });
  const ended = new Promise<number | 'cut'>((resolve) => {
    outgoing.once('error', () => resolve('cut'));
    outgoing.once('response', (response) => {
      response.resume();
      resolve(response.statusCode ?? 0);
    });
  });
  for (let sent = 0; sent < bytes; sent += 1) {
    outgoing.write('x');
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  outgoing.end();
  return ended;
}

describe('limitRequestTime', () => {
  it('cuts off a body that is still dripping in when the time is up', async () => {
    expect(await drip('application/json', 10)).toBe('cut');
  });

  it('lets a body pass that arrives in time', async () => {
    expect(await drip('application/json', 1)).toBe(200);
  });

  it('gives an upload the longer time', async () => {
    expect(await drip('multipart/form-data; boundary=b', 10)).toBe(200);
  });
});
