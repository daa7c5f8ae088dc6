/** Reads the plain messages that our own carrier sends: one text part, base64 or quoted-printable (RFC 2045, 2047). */

function fromQuotedPrintable(text: string): Buffer {
  const joined = text.replace(/=\r?\n/g, '');
  const bytes = joined.replace(/=([0-9A-F]{2})/gi, (_whole, hex: string) => String.fromCharCode(parseInt(hex, 16)));
  return Buffer.from(bytes, 'latin1');
}

/** Undoes encoded words such as `=?UTF-8?B?...?=`; white space between two of them belongs to neither. */
function headerText(value: string): string {
  const word = /=\?utf-8\?([BQ])\?([^?]*)\?=/gi;
  return value.replace(/\?=\s+=\?/g, '?==?').replace(word, (_whole, kind: string, coded: string) => {
    const bytes = kind.toUpperCase() === 'B' ? Buffer.from(coded, 'base64') : fromQuotedPrintable(coded.replaceAll('_', ' '));
    return bytes.toString('utf8');
  });
}

function headersOf(head: string): Map<string, string> {
  const headers = new Map<string, string>();
  for (const line of head.replace(/\r?\n[ \t]+/g, ' ').split(/\r?\n/)) {
    const colon = line.indexOf(':');
    if (colon > 0) headers.set(line.slice(0, colon).toLowerCase(), line.slice(colon + 1).trim());
  }
  return headers;
}

export function readMessage(message: Buffer): { subject: string; text: string } {
  const raw = message.toString('latin1');
  const gap = /\r?\n\r?\n/.exec(raw);
  const head = gap === null ? raw : raw.slice(0, gap.index);
  const body = gap === null ? '' : raw.slice(gap.index + gap[0].length);
  const headers = headersOf(head);
  const encoding = headers.get('content-transfer-encoding')?.toLowerCase() ?? '7bit';
  const bytes =
    encoding === 'base64' ? Buffer.from(body, 'base64') : encoding === 'quoted-printable' ? fromQuotedPrintable(body) : Buffer.from(body, 'latin1');
  return { subject: headerText(headers.get('subject') ?? ''), text: bytes.toString('utf8').replaceAll('\r\n', '\n').trimEnd() };
}
