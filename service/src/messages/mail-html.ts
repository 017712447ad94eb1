import type { Sendable } from './outgoing';

const escapes: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

const escaped = (text: string): string => text.replace(/[&<>"']/g, (character) => escapes[character] ?? '');

/** A line that is nothing but an address of ours becomes a link; no other text does. */
function lineHtml(line: string): string {
  const text = escaped(line);
  return /^https?:\/\/[^\s"'<>]+$/.test(line) ? `<a href="${text}">${text}</a>` : text;
}

/** The same words as the text part in one column, without images, in the colours the reader's program chooses. */
export function mailHtml({ subject, text }: Pick<Sendable, 'subject' | 'text'>): string {
  const paragraphs = text
    .split('\n\n')
    .map((part) => `<p>${part.split('\n').map(lineHtml).join('<br>')}</p>`);
  return [
    '<!doctype html><html lang="en"><head><meta charset="utf-8">',
    '<meta name="color-scheme" content="light dark">',
    `<title>${escaped(subject)}</title></head>`,
    '<body style="font-family:sans-serif;font-size:16px;line-height:1.4">',
    '<table role="presentation" width="100%" style="max-width:600px"><tr><td>',
    ...paragraphs,
    '</td></tr></table></body></html>',
  ].join('\n');
}
