import type { Instant } from '../lib/instant';
import { formatClock, formatZoneLetters } from '../lib/zone-time';
import type { AlertCause, Priority } from '../lateness/finding';
import { basicText, cutTo, plainWords } from './plain-words';

/** Longest text message that goes out as one. */
export const smsLength = 160;
/** Longest subject; mail programs cut long before that. */
const subjectLength = 180;
/** With less room than this beside it, the address of a text message is left out: the fact counts more. */
const shortestFact = 60;

/** What a message says about an alert. */
export interface TellableAlert {
  cause: AlertCause;
  priority: Priority;
  /** Where: "Track 3, train 1742". */
  subject: string;
  text: string;
  action: string;
  actor: string;
  lines: readonly string[];
  raisedAt: Instant;
}

/** What a message about an alert is made from. */
export interface AlertMessageFacts {
  alert: TellableAlert;
  terminal: { name: string; zone: string };
  /** Why this person: "on the desk". */
  because: string;
  /** Names of the others who were told. */
  others: readonly string[];
  /** Opens the turn or the list of alerts. */
  pageUrl: string;
  /** Opens the page with the one button. */
  takenUrl: string;
}

/** Words of a mail: its subject and its text part, complete in itself. */
export interface MailWords {
  subject: string;
  text: string;
}

const PRIORITY_WORDS: Readonly<Record<Priority, string>> = {
  'act-now': 'ACT NOW',
  'act-soon': 'Act soon',
  watch: 'Watch',
};

/** Where an alert is, in short: "Trk 3 train 1742". */
function shortPlace(subject: string): { track: string | null; train: string } {
  const parts = /^Track (.+), train (.*)$/.exec(subject);
  if (parts !== null) return { track: plainWords(parts[1] ?? ''), train: plainWords(parts[2] ?? '') };
  return { track: null, train: plainWords(subject.replace(/^Train /, '')) };
}

/** The fact of an alert: of a late departure the forecast, which is what the reader acts on. */
function factOf({ cause, text }: TellableAlert): string {
  const forecast = cause === 'late-departure' ? text.split('; ').at(-1) : undefined;
  return plainWords(forecast ?? text);
}

/**
 * Subject of the mail about an alert: the fact first. `ACT NOW 17:26 Harbor Trk 3 train 1742: No handbrake recorded …`,
 * or of a late departure `Short 17:24 Train 1742 Trk 3: ready about 17:43, leaves 17:40`. One line, whatever names hold.
 */
export function alertSubject({ alert, terminal }: Pick<AlertMessageFacts, 'alert' | 'terminal'>): string {
  const { track, train } = shortPlace(alert.subject);
  const clock = formatClock(alert.raisedAt, terminal.zone);
  const head =
    alert.cause === 'late-departure'
      ? `Short ${clock} Train ${train}${track === null ? '' : ` Trk ${track}`}`
      : `${PRIORITY_WORDS[alert.priority]} ${clock} ${plainWords(terminal.name)} ${track === null ? train : `Trk ${track} train ${train}`}`;
  return cutTo(`${head}: ${factOf(alert)}`, subjectLength);
}

/** Mail about an alert that somebody is to act on. Times in the zone of the terminal, which is named. */
export function alertMail(facts: AlertMessageFacts): MailWords {
  const { alert, terminal } = facts;
  const at = `${formatClock(alert.raisedAt, terminal.zone, { seconds: true })} ${formatZoneLetters(alert.raisedAt, terminal.zone)}`;
  const others = facts.others.map(plainWords).join(', ');
  const text = [
    `${plainWords(alert.subject)}, ${plainWords(terminal.name)}`,
    `${plainWords(alert.text).replace(/\.$/, '')}.`,
    `Since: ${at}`,
    ...alert.lines.map((line) => `- ${plainWords(line)}`),
    '',
    `To do: ${plainWords(alert.action)}`,
    `Who: ${plainWords(alert.actor)}`,
    `Also told: ${others === '' ? 'nobody else so far' : others}`,
    '',
    'Take it, so that nobody else does the same (one button, works once, for you, for 2 h):',
    facts.takenUrl,
    'Look at it:',
    facts.pageUrl,
    '',
    `You get this because you are ${facts.because} at ${plainWords(terminal.name)}.`,
    'Who is told, and when, is changed by a supervisor on the page Roster.',
    'This tells what is recorded and what is missing. Whether a train may move is for qualified people to decide.',
  ].join('\n');
  return { subject: alertSubject(facts), text };
}

/** What became of an alert that somebody was written to about. */
export interface AlertOutcome {
  /** Subject of the first mail, so that all of them stand in one thread. */
  firstSubject: string;
  kind: 'taken' | 'cleared';
  at: Instant;
  zone: string;
  /** Who took it. */
  by: string | null;
  pageUrl: string;
}

/** One line for those who were told: the same subject with `[taken by Reyes 17:27]` behind it. */
export function outcomeMail(outcome: AlertOutcome): MailWords {
  const clock = formatClock(outcome.at, outcome.zone);
  const what =
    outcome.kind === 'taken'
      ? `taken by ${plainWords(outcome.by ?? 'somebody')} ${clock}`
      : `cleared ${clock}`;
  const line =
    outcome.kind === 'taken'
      ? `Taken by ${plainWords(outcome.by ?? 'somebody')} at ${clock}.`
      : `Cleared at ${clock}: the condition is over.`;
  return {
    subject: `${plainWords(outcome.firstSubject)} [${what}]`,
    text: [line, '', 'Look at it:', outcome.pageUrl].join('\n'),
  };
}

/**
 * Text message about an alert in at most 160 characters of the basic table: `HARBOR T3 1742 Short: ready about 17:43,
 * leaves 17:40. Taken: <address>`. The fact is cut before the address; an address that would leave no room for the
 * fact is left out.
 */
export function alertSms({ alert, terminal, takenUrl }: AlertMessageFacts): string {
  const { track, train } = shortPlace(alert.subject);
  const place = plainWords(terminal.name).split(' ')[0]?.slice(0, 12).toUpperCase() ?? '';
  const where = `${place} ${track === null ? '' : `T${track} `}${train}`;
  const word = alert.cause === 'late-departure' ? 'Short' : PRIORITY_WORDS[alert.priority];
  const fact = basicText(`${where} ${word}: ${factOf(alert)}`);
  const tail = `. Taken: ${takenUrl}`;
  if (smsLength - tail.length < shortestFact) return cutTo(fact, smsLength);
  return `${cutTo(fact, smsLength - tail.length)}${tail}`;
}
