/**
 * One line of plain words from a text that people or files brought along: control characters and line ends become
 * blanks, so that it cannot begin a header or a line of its own, and nothing in it reads as an address that a mail
 * program would turn into a link. `'17\r\nhttp://a.example'` becomes `'17 http a. example'`.
 */
export function plainWords(text: string): string {
  return text
    .replace(/[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]+/gu, ' ')
    .replace(/:\/\//g, ' ')
    .replace(/([\p{L}\p{N}_-])\.(?=\p{L})/gu, '$1. ')
    .replace(/\s+/g, ' ')
    .trim();
}

/** Characters that a text message carries as one unit each: the basic table of 3GPP TS 23.038, without line ends. */
const basicCharacters = new Set(
  '@£$¥èéùìòÇØøÅåΔ_ΦΓΛΩΠΨΣΘΞÆæßÉ !"#¤%&\'()*+,-./0123456789:;<=>?¡ABCDEFGHIJKLMNOPQRSTUVWXYZÄÖÑÜ§¿abcdefghijklmnopqrstuvwxyzäöñüà',
);

const replacements: Readonly<Record<string, string>> = {
  '‘': "'",
  '’': "'",
  '“': '"',
  '”': '"',
  '–': '-',
  '—': '-',
  '−': '-',
  '…': '...',
  '[': '(',
  ']': ')',
  '{': '(',
  '}': ')',
  '`': "'",
  '~': '-',
  '|': '/',
  '\\': '/',
};

/**
 * A text in characters of the basic table only, so that 160 of them are one message: accents the table lacks are
 * dropped, typographic marks become plain ones, anything else a question mark. `'Łódź – “3”'` becomes `'?odz - "3"'`.
 */
export function basicText(text: string): string {
  return [...text].map(basicCharacter).join('');
}

function basicCharacter(character: string): string {
  if (basicCharacters.has(character)) return character;
  const plain = replacements[character] ?? character.normalize('NFD').replace(/\p{M}/gu, '');
  return [...plain].every((part) => basicCharacters.has(part)) ? plain : '?';
}

/** Cuts a text to a length, with three dots where something is missing. */
export function cutTo(text: string, longest: number): string {
  if (text.length <= longest) return text;
  return `${text.slice(0, Math.max(0, longest - 3)).trimEnd()}...`.slice(0, Math.max(0, longest));
}
