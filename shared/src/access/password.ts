import { passwordLongest, passwordShortest } from './password-lengths';

/** What is wrong with a password, as the code of the refusal; `good` when nothing is. */
export type PasswordVerdict = 'good' | 'password.too_short' | 'password.too_long' | 'password.common';

/**
 * Words that the public lists of leaked passwords are made of. With the endings below they stand for some tens of
 * thousands of entries; a list by itself would catch only what is spelled exactly so.
 */
const commonWords = new Set(
  (
    'password passwort passw0rd passwd pass qwerty qwertz azerty qwert asdf asdfgh asdfghjkl zxcvbn zxcvbnm qazwsx ' +
    'qazwsxedc qweasd qweasdzxc qwertyuiop welcome admin administrator root login letmein iloveyou monkey dragon ' +
    'football baseball basketball soccer hockey sunshine princess shadow superman batman master michael jennifer ' +
    'jordan harley ranger hunter trustno computer internet starwars pokemon charlie jessica ashley daniel andrew ' +
    'joshua thomas matthew robert freedom whatever cheese summer winter spring autumn hello secret changeme default ' +
    'guest temp temporary test testing user access abc abcd abcde abcdef abcdefg abcdefgh aaaa test1234 flower ' +
    'lovely loveme babygirl chocolate cookie banana orange purple silver golden diamond mustang corvette ferrari ' +
    'mercedes yankees dodgers cowboys steelers lakers eagles liverpool chelsea arsenal barcelona maverick phoenix ' +
    'thunder tigger ginger pepper killer matrix merlin scooter samsung google facebook nicole michelle amanda ' +
    'william anthony jackson london newyork boston chicago america january february march april may june july ' +
    'august september october november december monday tuesday wednesday thursday friday saturday sunday ' +
    'stubpost railroad railway train trains conductor engineer dispatcher station terminal platform locomotive'
  ).split(' '),
);

const leet: Record<string, string> = {
  '0': 'o',
  '1': 'i',
  '3': 'e',
  '4': 'a',
  '5': 's',
  '7': 't',
  '@': 'a',
  $: 's',
};

/**
 * Judges a password: 8 to 128 characters, counted as a person counts them; not one of the well-known ones (also with
 * digits and signs round it, or digits for letters); not a run or a repetition; not the person's own name or address.
 * No rule about kinds of characters. Source: OWASP ASVS 5.0, 6.2.1, 6.2.4, 6.2.5, 6.2.9.
 *
 * `judgePassword('Password2024!', [])` is `password.common`.
 */
export function judgePassword(password: string, personal: readonly string[]): PasswordVerdict {
  const characters = [...password];
  if (characters.length < passwordShortest) return 'password.too_short';
  if (characters.length > passwordLongest) return 'password.too_long';
  const small = password.toLowerCase();
  if (isRunOrRepetition(small) || isCommon(small) || isPersonal(small, personal)) return 'password.common';
  return 'good';
}

function isCommon(small: string): boolean {
  const candidates = [small, [...small].map((character) => leet[character] ?? character).join('')];
  return candidates.some((candidate) => {
    const word = candidate.replace(/^[^a-z]+|[^a-z]+$/g, '');
    return commonWords.has(candidate) || commonWords.has(word) || commonWords.has(halfOf(word));
  });
}

/** `passwordpassword` is `password` twice. */
function halfOf(word: string): string {
  const half = word.slice(0, word.length / 2);
  return half + half === word ? half : word;
}

/** All one pattern of up to four characters over and over, or every character next to the one before. */
function isRunOrRepetition(small: string): boolean {
  for (let length = 1; length <= 4; length += 1) {
    if (
      small ===
      small
        .slice(0, length)
        .repeat(Math.ceil(small.length / length))
        .slice(0, small.length)
    )
      return true;
  }
  const steps = new Set(
    [...small].slice(1).map((character, index) => character.charCodeAt(0) - small.charCodeAt(index)),
  );
  const [step] = steps;
  return (steps.size === 1 && (step === 1 || step === -1)) || '01234567890123456789'.includes(small);
}

function isPersonal(small: string, personal: readonly string[]): boolean {
  const bare = small.replace(/[^a-z]/g, '');
  return personal
    .flatMap((text) => [text, text.split('@')[0] ?? ''])
    .map((text) => text.toLowerCase().replace(/[^a-z]/g, ''))
    .some((text) => text.length >= 4 && (bare === text || bare === text + text));
}
