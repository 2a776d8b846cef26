import { once } from 'node:events';
import type { AddressInfo } from 'node:net';
import { SMTPServer } from 'smtp-server';

export interface ReceivedMail {
  readonly recipients: string[];
  /** The whole mail as it came over the line. */
  readonly source: string;
}
export type SmtpMood =
  | 'take'
  /** 451 after the mail: try again later. */
  | 'later'
  /** 550 for the recipient: never. */
  | 'refuse'
  /** Cuts the line after the whole mail, without an answer. */
  | 'drop';
export interface SmtpTestServer {
  readonly url: string;
  readonly received: ReceivedMail[];
  mood: SmtpMood;
  stop: () => Promise<void>;
}

/** A mail server that keeps what it is given and can be in several moods. */
export async function startSmtp(port = 0): Promise<SmtpTestServer> {
  const received: ReceivedMail[] = [];
  const state: { mood: SmtpMood } = { mood: 'take' };
  const refusal = (responseCode: number): Error =>
    Object.assign(new Error('Not now <who@example.org>'), { responseCode });
  const sockets = new Map<string, { destroy: () => void }>();
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    logger: false,
    onRcptTo: (_address, _session, done) => done(state.mood === 'refuse' ? refusal(550) : null),
    onData: (stream, session, done) => {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('end', () => {
        if (state.mood === 'later') {
          done(refusal(451));
          return;
        }
        received.push({
          recipients: session.envelope.rcptTo.map(({ address }) => address),
          source: Buffer.concat(chunks).toString('utf8'),
        });
        if (state.mood === 'drop') for (const socket of sockets.values()) socket.destroy();
        else done();
      });
    },
  });
  server.server.on('connection', (socket) => {
    const name = `${String(socket.remotePort)}`;
    sockets.set(name, socket);
    socket.once('close', () => sockets.delete(name));
  });
  server.on('error', () => undefined);
  server.listen(port, '127.0.0.1');
  await once(server.server, 'listening');
  const address = server.server.address() as AddressInfo;
  return {
    url: `smtp://127.0.0.1:${String(address.port)}`,
    received,
    get mood() {
      return state.mood;
    },
    set mood(mood) {
      state.mood = mood;
    },
    stop: () =>
      new Promise((resolve) => {
        for (const socket of sockets.values()) socket.destroy();
        server.close(() => resolve());
      }),
  };
}
