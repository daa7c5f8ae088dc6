import { randomUUID } from 'node:crypto';
import type { AddressInfo } from 'node:net';
import { SMTPServer, type SMTPServerSession } from 'smtp-server';
import type { Letter } from '../../shared/contracts/session';
import { readMessage } from './message-reader';

/** Older letters make room. */
const MAX_KEPT = 200;
const MAX_MESSAGE_BYTES = 256 * 1024;

/** A mail server on loopback that keeps what it receives in memory, for development and demonstration without one. */
export class LetterBox {
  private constructor(
    private readonly server: SMTPServer,
    private readonly letters: readonly Letter[],
    readonly url: string,
  ) {}

  static async open(now: () => Date): Promise<LetterBox> {
    const received: Letter[] = [];
    const server = new SMTPServer({
      authOptional: true,
      disabledCommands: ['STARTTLS', 'AUTH'],
      size: MAX_MESSAGE_BYTES,
      logger: false,
      onData: (stream, session, done) => {
        const chunks: Buffer[] = [];
        // `size` is only announced to senders; what comes above it is read away and refused at the end.
        stream.on('data', (chunk: Buffer) => stream.sizeExceeded || chunks.push(chunk));
        stream.on('error', done);
        stream.on('end', () => {
          if (stream.sizeExceeded) {
            done(Object.assign(new Error('the letter is above the size limit'), { responseCode: 552 }));
            return;
          }
          for (const to of recipientsOf(session)) {
            received.unshift({ id: randomUUID(), to, ...readMessage(Buffer.concat(chunks)), receivedAt: now().toISOString() });
          }
          received.splice(MAX_KEPT);
          done();
        });
      },
    });
    await new Promise<void>((resolve, reject) => {
      server.on('error', reject);
      server.listen(0, '127.0.0.1', () => resolve());
    });
    const { port } = server.server.address() as AddressInfo;
    return new LetterBox(server, received, `smtp://127.0.0.1:${port}`);
  }

  /** Newest first. */
  received(): readonly Letter[] {
    return this.letters;
  }

  async close(): Promise<void> {
    await new Promise<void>((resolve) => this.server.close(() => resolve()));
  }
}

const recipientsOf = (session: SMTPServerSession): string[] => session.envelope.rcptTo.map(({ address }) => address.toLowerCase());
