import { createTransport } from 'nodemailer';
import { LetterBox } from './letter-box';

const now = (): Date => new Date('2027-01-01T00:00:00Z');

describe('LetterBox', () => {
  let box: LetterBox;
  beforeEach(async () => {
    box = await LetterBox.open(now);
  });
  afterEach(() => box.close());

  async function send(to: string | string[], subject: string): Promise<void> {
    const transport = createTransport(box.url);
    await transport.sendMail({ from: 'slantwise@localhost', to, subject, text: `about ${subject}` });
    transport.close();
  }

  it('listens on loopback alone and keeps what it receives, newest first', async () => {
    expect(box.url).toMatch(/^smtp:\/\/127\.0\.0\.1:\d+$/);
    await send('Ada@new.example', 'first');
    await send('ada@new.example', 'second – zweiter');
    expect(box.received()).toEqual([
      { id: expect.any(String), to: 'ada@new.example', subject: 'second – zweiter', text: 'about second – zweiter', receivedAt: '2027-01-01T00:00:00.000Z' },
      { id: expect.any(String), to: 'ada@new.example', subject: 'first', text: 'about first', receivedAt: '2027-01-01T00:00:00.000Z' },
    ]);
  });

  it('keeps one letter for each recipient', async () => {
    await send(['a@x.example', 'b@x.example'], 'both');
    expect(box.received().map(({ to }) => to).sort()).toEqual(['a@x.example', 'b@x.example']);
  });

  it('forgets the oldest above two hundred', async () => {
    const many = Array.from({ length: 201 }, (_unused, index) => `person${index}@x.example`);
    await send(many.slice(0, 100), 'early');
    await send(many.slice(100), 'late');
    expect(box.received()).toHaveLength(200);
    expect(box.received().filter(({ subject }) => subject === 'early')).toHaveLength(99);
  });

  it('refuses a letter that is too large', async () => {
    const transport = createTransport(box.url);
    await expect(transport.sendMail({ from: 'a@x.example', to: 'b@x.example', text: 'x'.repeat(300_000) })).rejects.toThrow(/size/i);
    transport.close();
    expect(box.received()).toEqual([]);
  });
});
