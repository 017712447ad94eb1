/** What the box shows of a mail that we ourselves have sent: its id, subject and text part. */
export function readMail(raw: string): { id: string; subject: string; text: string } {
  const [head = '', ...rest] = raw.split('\r\n\r\n');
  const headers = headersOf(head);
  const boundary = /boundary="([^"]+)"/.exec(headers.get('content-type') ?? '')?.[1];
  const body = rest.join('\r\n\r\n');
  return {
    id: headers.get('message-id') ?? '',
    subject: decodedWords(headers.get('subject') ?? ''),
    text: boundary === undefined ? decodedPart(headers, body) : firstPart(body, boundary),
  };
}

/** Headers by name in small letters; lines that go on with a blank are put together. */
function headersOf(head: string): Map<string, string> {
  const lines = head.replace(/\r\n[ \t]+/g, ' ').split('\r\n');
  return new Map(
    lines.map((line) => {
      const colon = line.indexOf(':');
      return [line.slice(0, colon).toLowerCase(), line.slice(colon + 1).trim()] as const;
    }),
  );
}

function firstPart(body: string, boundary: string): string {
  const part = body.split(`--${boundary}\r\n`)[1] ?? '';
  const end = part.indexOf(`\r\n--${boundary}`);
  const [head = '', ...rest] = (end < 0 ? part : part.slice(0, end)).split('\r\n\r\n');
  return decodedPart(headersOf(head), rest.join('\r\n\r\n'));
}

function decodedPart(headers: Map<string, string>, body: string): string {
  const encoding = headers.get('content-transfer-encoding')?.toLowerCase();
  const text =
    encoding === 'base64'
      ? Buffer.from(body, 'base64').toString('utf8')
      : encoding === 'quoted-printable'
        ? unquoted(body.replace(/=\r\n/g, ''))
        : body;
  return text.replace(/\r\n/g, '\n').trim();
}

function unquoted(text: string): string {
  const bytes = text.replace(/=([0-9A-F]{2})/gi, (_, hex: string) => String.fromCharCode(parseInt(hex, 16)));
  return Buffer.from(bytes, 'latin1').toString('utf8');
}

/** Encoded words of a header (RFC 2047), those that follow one another put together. */
function decodedWords(text: string): string {
  return text
    .replace(/\?=\s+=\?/g, '?==?')
    .replace(/=\?utf-8\?([bq])\?([^?]*)\?=/gi, (_, kind: string, content: string) =>
      kind.toLowerCase() === 'b'
        ? Buffer.from(content, 'base64').toString('utf8')
        : unquoted(content.replace(/_/g, ' ')),
    );
}
