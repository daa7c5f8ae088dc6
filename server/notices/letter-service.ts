import { randomUUID } from 'node:crypto';
import { createTransport, type Transporter } from 'nodemailer';
import type { Letter } from '../../shared/contracts/session';
import type { Ground } from '../database/ground';
import { afterCommit, type Transaction } from '../database/transaction-runner';
import { LetterBox } from './letter-box';
import { LetterRepository } from './letter-repository';
import { seal, unseal } from './seal';

export interface NewLetter {
  readonly to: string;
  readonly subject: string;
  readonly text: string;
}

interface Carrier {
  readonly transport: Transporter;
  readonly box: LetterBox | null;
  readonly timer: NodeJS.Timeout;
}

const POLL_MS = 15_000;
const MAX_ATTEMPTS = 10;
/** 5 s, 10 s, 20 s ... about 40 minutes before the last one. */
const retryDelayMs = (attempts: number): number => 5000 * 2 ** (attempts - 1);

/** One line and no control characters: a name in a subject must not start another header. */
const oneLine = (text: string): string => [...text].map((mark) => (mark < ' ' ? ' ' : mark)).join('').trim();

/** A row stays locked while its letter is sent, so a silent mail server must not hold it long. */
function withTimeouts(smtpUrl: string): string {
  const url = new URL(smtpUrl);
  for (const name of ['connectionTimeout', 'greetingTimeout', 'socketTimeout']) url.searchParams.set(name, '10000');
  return url.href;
}

/** Letters go through an outbox row in the transaction of their cause, and are sent after it is committed. */
export class LetterService {
  private readonly rows = new LetterRepository();
  private carrier: Carrier | null = null;
  private sending: Promise<void> = Promise.resolve();

  constructor(private readonly ground: Ground) {}

  /** Without an address of a mail server, this server's own letter box receives everything. */
  get usesLetterBox(): boolean {
    return this.ground.config.smtpUrl === null;
  }

  /** Begins to send. Programs that only write letters never call this; the server finds their letters. */
  async start(): Promise<void> {
    const { config, logger, now } = this.ground;
    const box = config.smtpUrl === null ? await LetterBox.open(now) : null;
    if (box !== null) logger[config.demoMode ? 'info' : 'warn']('SMTP_URL is not set: letters go to the letter box of this server');
    const transport = createTransport(withTimeouts(config.smtpUrl ?? box?.url ?? ''), { from: config.mailFrom });
    // Now and then, for letters whose mail server failed and those another process left behind.
    const timer = setInterval(() => this.sendDue(), POLL_MS).unref();
    this.carrier = { transport, box, timer };
    this.sendDue();
  }

  /** What the letter box received for these addresses, newest first. */
  received(addresses: ReadonlySet<string>): Letter[] {
    return (this.carrier?.box?.received() ?? []).filter((letter) => addresses.has(letter.to));
  }

  async post(transaction: Transaction, letter: NewLetter): Promise<void> {
    const now = this.ground.now();
    await this.rows.insert(transaction, {
      id: randomUUID(),
      recipient: letter.to,
      subject: oneLine(letter.subject),
      sealedText: seal(this.ground.config.secret, letter.text),
      createdAt: now,
      attempts: 0,
      nextAttemptAt: now,
      sentAt: null,
      lastError: null,
    });
    afterCommit(transaction, () => this.sendDue());
  }

  /** Resolves when everything that is due has been tried. */
  async settled(): Promise<void> {
    await this.sending;
  }

  async close(): Promise<void> {
    clearInterval(this.carrier?.timer);
    await this.sending;
    this.carrier?.transport.close();
    await this.carrier?.box?.close();
    this.carrier = null;
  }

  private sendDue(): void {
    const { carrier } = this;
    if (carrier === null) return;
    this.sending = this.sending
      .then(() => this.sendAll(carrier.transport))
      .catch((error: unknown) => this.ground.logger.error({ err: error }, 'letters could not be looked up'));
  }

  private async sendAll(transport: Transporter): Promise<void> {
    while (await this.sendOne(transport));
  }

  /** The row stays locked while the mail server answers, so that no other process sends the same letter. */
  private async sendOne(transport: Transporter): Promise<boolean> {
    const { transactions, config, logger, now } = this.ground;
    return transactions.run(async (transaction) => {
      const letter = await this.rows.nextDue(transaction, now());
      if (letter === null) return false;
      try {
        await transport.sendMail({
          to: letter.recipient,
          subject: letter.subject,
          text: unseal(config.secret, letter.sealedText),
          messageId: `<${letter.id}@slantwise>`,
          disableFileAccess: true,
          disableUrlAccess: true,
        });
        const sent = { sentAt: now(), nextAttemptAt: null, sealedText: Buffer.alloc(0), attempts: letter.attempts + 1 };
        await this.rows.change(transaction, letter.id, sent);
      } catch (error) {
        const attempts = letter.attempts + 1;
        const nextAttemptAt = attempts >= MAX_ATTEMPTS ? null : new Date(now().getTime() + retryDelayMs(attempts));
        const lastError = error instanceof Error ? error.message : String(error);
        logger.warn({ letterId: letter.id, attempts, givenUp: nextAttemptAt === null, lastError }, 'letter not sent');
        await this.rows.change(transaction, letter.id, { attempts, nextAttemptAt, lastError });
      }
      return true;
    });
  }
}
