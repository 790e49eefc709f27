/**
 * Subject and text of a plain-text mail as our mailer writes it: one part, with folded headers, encoded words in
 * the subject, and quoted-printable or base64 in the body (RFC 2045, RFC 2047).
 */
export function readMail(message: string): { subject: string; text: string } {
  const end = message.search(/\r?\n\r?\n/);
  const head = (end < 0 ? message : message.slice(0, end)).replace(/\r?\n[ \t]+/g, ' ');
  const body = end < 0 ? '' : message.slice(end).replace(/^\r?\n\r?\n/, '');
  const header = (name: string) => new RegExp(`^${name}:[ \\t]*(.*)$`, 'im').exec(head)?.[1]?.trim() ?? '';
  const encoding = header('content-transfer-encoding').toLowerCase();
  return {
    subject: decodeWords(header('subject')),
    text: decodeBody(body, encoding).replace(/\r\n/g, '\n').trimEnd(),
  };
}

function decodeBody(body: string, encoding: string): string {
  if (encoding === 'base64') return Buffer.from(body, 'base64').toString('utf8');
  if (encoding === 'quoted-printable') return decodeQuotedPrintable(body.replace(/=\r?\n/g, ''));
  return body;
}

function decodeQuotedPrintable(text: string): string {
  const bytes = text.replace(/=([0-9A-F]{2})/gi, (_, hex: string) => String.fromCharCode(parseInt(hex, 16)));
  // Every character above is one byte of UTF-8: quoted-printable text is ASCII.
  return Buffer.from(bytes, 'latin1').toString('utf8');
}

function decodeWords(text: string): string {
  return text
    .replace(/\?=\s+=\?/g, '?==?')
    .replace(/=\?utf-8\?([bq])\?([^?]*)\?=/gi, (_, kind: string, coded: string) =>
      kind.toLowerCase() === 'b'
        ? Buffer.from(coded, 'base64').toString('utf8')
        : decodeQuotedPrintable(coded.replace(/_/g, ' ')),
    );
}
