import { createTransport } from 'nodemailer';
import { readMessage } from './message-reader';

/** A message as our own carrier writes it, without sending. */
async function written(subject: string, text: string): Promise<Buffer> {
  const transport = createTransport({ streamTransport: true, buffer: true, newline: 'windows' });
  const { message } = await transport.sendMail({ from: 'a@b.example', to: 'c@d.example', subject, text });
  return message as Buffer;
}

describe('readMessage', () => {
  it.each([
    ['Plain', 'One line.'],
    ['Über die Brücke – 橋', 'Grüße aus Zürich 🌊\n\nhttps://slantwise.example/invitation#aB-_9'],
    ['A long subject '.repeat(12).trim(), `${'word '.repeat(60).trim()}\n= signs = and =3D in the text`],
    ['Ends', 'Dots\n.\n..\nand blanks'],
  ])('reads back the message %j', async (subject, text) => {
    expect(readMessage(await written(subject, text))).toEqual({ subject, text });
  });

  it('reads a message without a body', () => {
    expect(readMessage(Buffer.from('Subject: Only this'))).toEqual({ subject: 'Only this', text: '' });
  });
});
