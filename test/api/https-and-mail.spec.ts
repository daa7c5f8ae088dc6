import { once } from 'node:events';
import type { AddressInfo } from 'node:net';
import { SMTPServer } from 'smtp-server';
import { readMessage } from '../../server/notices/message-reader';
import { Api, TEST_PASSWORD } from '../support/api';
import { expectNotFound } from '../support/problems';

/** A mail server that refuses as often as told, then accepts. */
class MailServer {
  readonly received: { to: string; subject: string; text: string }[] = [];
  refusals = 0;
  private readonly server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onData: (stream, session, done) => {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('end', () => {
        if (this.refusals > 0) {
          this.refusals -= 1;
          done(new Error('mailbox busy'));
          return;
        }
        this.received.push({ to: session.envelope.rcptTo[0]?.address ?? '', ...readMessage(Buffer.concat(chunks)) });
        done();
      });
    },
  });

  async start(): Promise<string> {
    const listening = this.server.listen(0, '127.0.0.1');
    await once(listening, 'listening');
    return `smtp://127.0.0.1:${(listening.address() as AddressInfo).port}`;
  }

  stop(): Promise<void> {
    return new Promise((resolve) => this.server.close(() => resolve()));
  }
}

describe('behind https, with a mail server', () => {
  const mail = new MailServer();
  let api: Api;
  beforeAll(async () => {
    api = await Api.start({ environment: { SMTP_URL: await mail.start(), SLANTWISE_PUBLIC_URL: 'https://slantwise.example', MAIL_FROM: 'Slantwise <desk@slantwise.example>' } });
  }, 60_000);
  afterAll(async () => {
    await api.close();
    await mail.stop();
  });

  it('binds the cookies to https and to this host, and tells browsers to stay on https', async () => {
    const answer = await api.anonymous().post('/api/session', { email: 'admin@merrow.example', password: TEST_PASSWORD });
    const [access = '', refresh = '', forgery = ''] = answer.headers.getSetCookie();
    expect(access).toMatch(/^__Host-slantwise-access=[^;]+; Max-Age=\d+; Path=\/; Expires=[^;]+; HttpOnly; Secure; SameSite=Strict$/);
    expect(refresh).toMatch(/^__Secure-slantwise-refresh=[^;]+; Max-Age=\d+; Path=\/api\/session; Expires=[^;]+; HttpOnly; Secure; SameSite=Strict$/);
    expect(forgery).toMatch(/^XSRF-TOKEN=[^;]+; Max-Age=\d+; Path=\/; Expires=[^;]+; Secure; SameSite=Strict$/);
    expect(answer.headers.get('strict-transport-security')).toBe('max-age=31536000; includeSubDomains');
  });

  it('sends letters to the mail server, and shows no letter box', async () => {
    const admin = await api.signedIn('admin');
    await admin.post('/api/team/invitations', { email: 'ada@new.example', roles: ['lab'] });
    await api.house.letters.settled();
    expect(mail.received).toEqual([
      { to: 'ada@new.example', subject: 'Invitation to the team Merrow Point on Slantwise', text: expect.stringContaining('https://slantwise.example/invitation#') },
    ]);
    expectNotFound(await admin.get('/api/development/letters'), 'letter box');
    expect((await admin.get('/api/about')).json).toMatchObject({ letterBox: false });
  });

  it('keeps a letter that the mail server refuses, sealed, and sends it later', async () => {
    mail.refusals = 1;
    const before = mail.received.length;
    await api.anonymous().post('/api/password-resets', { email: 'lab@merrow.example' });
    await api.house.passwords.settled();
    await api.house.letters.settled();
    const [row] = await api.query(`SELECT attempts, sent_at, last_error, next_attempt_at > now() AS later FROM letter WHERE recipient = 'lab@merrow.example'`);
    expect(row).toEqual({ attempts: 1, sent_at: null, last_error: expect.stringContaining('mailbox busy'), later: true });
    const [stored] = await api.query<{ sealed_text: Buffer }>(`SELECT sealed_text FROM letter WHERE recipient = 'lab@merrow.example'`);
    expect(stored?.sealed_text.toString('latin1')).not.toContain('new-password');
    await api.query(`UPDATE letter SET next_attempt_at = now() WHERE sent_at IS NULL`);
    await api.anonymous().post('/api/password-resets', { email: 'range@merrow.example' });
    await api.house.passwords.settled();
    await api.house.letters.settled();
    expect(mail.received.slice(before).map(({ to }) => to).sort()).toEqual(['lab@merrow.example', 'range@merrow.example']);
    const [sent] = await api.query(`SELECT attempts, length(sealed_text) AS left, last_error IS NULL AS clean FROM letter WHERE recipient = 'lab@merrow.example'`);
    expect(sent).toEqual({ attempts: 2, left: 0, clean: false });
  });

  it('writes no letter for a change that did not happen', async () => {
    const before = mail.received.length;
    const admin = await api.signedIn('admin');
    const invite = () => admin.post('/api/team/invitations', { email: 'twice@new.example', roles: ['lab'] });
    expect([(await invite()).status, (await invite()).status]).toEqual([201, 409]);
    await api.house.letters.settled();
    expect(mail.received.length).toBe(before + 1);
  });

  it('keeps serving when the database cuts every connection', async () => {
    await api.query('SELECT pg_terminate_backend(pid) FROM pg_stat_activity WHERE datname = current_database() AND pid <> pg_backend_pid()');
    await new Promise((resolve) => setTimeout(resolve, 200));
    const statuses = [await api.anonymous().get('/api/ready'), await api.anonymous().get('/api/ready')].map(({ status }) => status);
    expect(statuses.at(-1)).toBe(200);
    expect((await (await api.signedIn('lab')).get('/api/team')).status).toBe(200);
  });
});
