import { once } from 'node:events';
import { connect } from 'node:net';
import { setTimeout as sleep } from 'node:timers/promises';
import type { Api, Client } from './api.ts';

const CHUNK = Buffer.alloc(64 * 1024, 0x37);

/**
 * Sends a file of `size` bytes a piece at a time, and stops as soon as an answer comes: what a
 * refusal costs, without the race between an answer and a cut connection that `fetch` would run.
 *
 * @returns the answer as text and the bytes sent until then
 */
export async function slowUpload(
  api: Api,
  client: Client,
  path: string,
  size: number,
): Promise<{ status: number; answer: string; sent: number }> {
  const socket = connect(Number(new URL(api.baseUrl).port), '127.0.0.1');
  socket.on('error', () => undefined);
  await once(socket, 'connect');
  let answer = '';
  socket.on('data', (bytes: Buffer) => (answer += bytes.toString('utf8')));
  const cookies = [...client.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
  const head = [
    `POST ${path} HTTP/1.1`,
    'Host: 127.0.0.1',
    `Origin: ${api.baseUrl}`,
    ...(cookies ? [`Cookie: ${cookies}`] : []),
    ...(client.token === null ? [] : [`X-Spyhole-Token: ${client.token}`]),
    'Content-Type: multipart/form-data; boundary=x',
    `Content-Length: ${String(size)}`,
  ];
  const part = '--x\r\nContent-Disposition: form-data; name="file"; filename="a.jpg"\r\n\r\n';
  socket.write(`${head.join('\r\n')}\r\n\r\n${part}`);
  let sent = part.length;
  while (answer === '' && sent + CHUNK.length <= size && !socket.destroyed) {
    socket.write(CHUNK);
    sent += CHUNK.length;
    await sleep(5);
  }
  if (!socket.destroyed) await once(socket, 'close');
  return { status: Number(answer.slice(9, 12)), answer, sent };
}
