import type { AddressInfo } from 'node:net';
import { SMTPServer } from 'smtp-server';

export interface ReceivedMail {
  to: string[];
  headers: string;
  text: string;
}

export interface FakeSmtp {
  url: string;
  received: ReceivedMail[];
  /** Answers every message with this instead of taking it. */
  answer: { code: number; text: string } | null;
  refusedAddress: string | null;
  delayMs: number;
  stop: () => Promise<void>;
}

function errorWith(code: number, text: string): Error {
  return Object.assign(new Error(text), { responseCode: code });
}

/** A mail server on 127.0.0.1 that keeps what it gets. */
export async function startFakeSmtp(): Promise<FakeSmtp> {
  const fake: FakeSmtp = {
    url: '',
    received: [],
    answer: null,
    refusedAddress: null,
    delayMs: 0,
    stop: () => new Promise((resolve) => server.close(() => resolve())),
  };
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    onRcptTo: ({ address }, _session, done) =>
      done(address === fake.refusedAddress ? errorWith(550, 'No such person') : null),
    onData: (stream, session, done) => {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('end', () => {
        if (fake.answer) return done(errorWith(fake.answer.code, fake.answer.text));
        const [headers = '', ...body] = Buffer.concat(chunks).toString('utf8').split('\r\n\r\n');
        const text = body.join('\n\n').replace(/=\r\n/g, '');
        fake.received.push({ to: session.envelope.rcptTo.map((entry) => entry.address), headers, text });
        setTimeout(() => done(), fake.delayMs);
      });
    },
  });
  await new Promise<void>((resolve, reject) => {
    server.on('error', reject);
    server.listen(0, '127.0.0.1', resolve);
  });
  fake.url = `smtp://127.0.0.1:${(server.server.address() as AddressInfo).port}`;
  return fake;
}
