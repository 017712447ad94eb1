import { describe, expect, test } from 'vitest';
import { seededRandom } from '../testing/seeded-random';
import { type AlertMessageFacts, alertMail, alertSms, alertSubject, outcomeMail } from './alert-message';
import { basicText, cutTo, plainWords } from './plain-words';
import { silenceWords } from './silence-message';

const facts = (alert: Partial<AlertMessageFacts['alert']> = {}): AlertMessageFacts => ({
  alert: {
    cause: 'unsecured',
    priority: 'act-now',
    subject: 'Track 3, train 1742',
    text: 'No handbrake recorded and nobody at the brakes since 17:25:40',
    action: 'Send somebody to the train.',
    actor: 'dispatcher, conductor M. Tolland',
    lines: ['Gap so far: 40 s'],
    raisedAt: Date.parse('2026-03-03T22:26:20Z'),
    ...alert,
  },
  terminal: { name: 'Harbor Terminal', zone: 'America/New_York' },
  because: 'on the desk',
  others: ['R. Brandreth'],
  pageUrl: 'https://stubpost.example/turns/t1',
  takenUrl: 'https://stubpost.example/t/AAAAAAAAAAAAAAAAAAAAAA',
});
const late = {
  cause: 'late-departure',
  priority: 'watch',
  text: 'Handbrake set not recorded, latest 17:24; ready about 17:43, leaves 17:40, 3 min short',
} as const;

describe('a message about an alert', () => {
  test('has the fact as its subject', () => {
    expect(alertSubject(facts())).toBe(
      'ACT NOW 17:26 Harbor Terminal Trk 3 train 1742: No handbrake recorded and nobody at the brakes since 17:25:40',
    );
    expect(alertSubject(facts(late))).toBe(
      'Short 17:26 Train 1742 Trk 3: ready about 17:43, leaves 17:40, 3 min short',
    );
    expect(alertSubject(facts({ subject: 'Train 9' }))).toContain('Harbor Terminal 9: ');
  });

  test('says in its text part what is wrong, since when, what to do, who, who else was told, and how to take it', () => {
    const { text } = alertMail(facts());
    for (const part of [
      'nobody at the brakes since 17:25:40.',
      'Since: 17:26:20 EST',
      '- Gap so far: 40 s',
      'To do: Send somebody to the train.',
      'Who: dispatcher, conductor M. Tolland',
      'Also told: R. Brandreth',
      'https://stubpost.example/t/AAAAAAAAAAAAAAAAAAAAAA',
      'https://stubpost.example/turns/t1',
      'because you are on the desk at Harbor Terminal',
    ])
      expect(text).toContain(part);
    expect(text).not.toMatch(/\bsafe\b/);
  });

  test('tells what became of it under the first subject', () => {
    const outcome = {
      firstSubject: 'ACT NOW 17:26 X',
      at: Date.parse('2026-03-03T22:27:00Z'),
      zone: 'America/New_York',
      by: 'M. Reyald',
      pageUrl: 'https://stubpost.example/alerts',
    };
    expect(outcomeMail({ ...outcome, kind: 'taken' })).toEqual({
      subject: 'ACT NOW 17:26 X [taken by M. Reyald 17:27]',
      text: 'Taken by M. Reyald at 17:27.\n\nLook at it:\nhttps://stubpost.example/alerts',
    });
    expect(outcomeMail({ ...outcome, kind: 'cleared' }).subject).toBe('ACT NOW 17:26 X [cleared 17:27]');
  });

  test('fits one text message, place and fact first, the address whole', () => {
    expect(alertSms(facts(late))).toBe(
      'HARBOR T3 1742 Short: ready about 17:43, leaves 17:40, 3 min short. Taken: https://stubpost.example/t/AAAAAAAAAAAAAAAAAAAAAA',
    );
    const long = alertSms(facts({ text: 'Something long '.repeat(40) }));
    expect(long.length).toBeGreaterThan(150);
    expect(long.length).toBeLessThanOrEqual(160);
    expect(long).toMatch(/\.\.\.\. Taken: https:\/\/stubpost\.example\/t\/A{22}$/);
  });

  test('leaves an address out that would leave no room for the fact', () => {
    const sms = alertSms({ ...facts(late), takenUrl: `https://${'long.'.repeat(30)}example/t/A` });
    expect(sms).toBe('HARBOR T3 1742 Short: ready about 17:43, leaves 17:40, 3 min short');
  });
});

describe('names that people or files brought along', () => {
  const bad = [
    '17\r\nBcc: all@evil.example',
    '"17" <script>alert(1)</script>',
    '17\nTaken: http://evil.example/t/x',
    "O'Neil\u2028X\u0000\u001b[31m\u202e",
    'www.evil.com',
  ];

  test.each(bad)('%j begins no header, no line and no link', (name) => {
    const made = facts({
      subject: `Track ${name}, train ${name}`,
      text: `${name} not recorded`,
      action: name,
      actor: name,
      lines: [name],
    });
    made.terminal.name = name;
    made.others = [name];
    const { subject, text } = alertMail(made);
    const clean = alertMail(facts({ lines: ['one'] })).text.split('\n').length;
    expect(subject).not.toMatch(/[\r\n\u2028\p{Cc}]/u);
    expect(text.split('\n')).toHaveLength(clean);
    expect(text.match(/\w+:\/\/\S+/g)).toEqual([made.takenUrl, made.pageUrl]);
    expect(`${subject}\n${text}`).not.toMatch(/evil\.(com|example)/);
    const sms = alertSms(made);
    expect(sms.length).toBeLessThanOrEqual(160);
    expect(sms.match(/\w+:\/\/\S+/g) ?? []).toEqual([made.takenUrl]);
    expect(
      outcomeMail({ firstSubject: name, kind: 'taken', at: 0, zone: 'UTC', by: name, pageUrl: 'x' }).subject,
    ).not.toMatch(/[\r\n\u2028]/);
  });

  test('any text at all gives a text message of the basic table within 160', () => {
    const random = seededRandom(20_260_303);
    const basic = /^[@£$¥èéùìòÇØøÅåΔ_ΦΓΛΩΠΨΣΘΞÆæßÉ !"#¤%&'()*+,\-./0-9:;<=>?¡A-ZÄÖÑÜ§¿a-zäöñüà]*$/;
    for (let round = 0; round < 300; round += 1) {
      const text = String.fromCodePoint(
        ...Array.from({ length: Math.floor(random() * 200) }, () => Math.floor(random() * 0xd7ff)),
      );
      const sms = alertSms(facts({ text, subject: `Track ${text.slice(0, 12)}, train ${text.slice(-9)}` }));
      expect(sms).toMatch(basic);
      expect(sms.length).toBeLessThanOrEqual(160);
    }
  });
});

test.each([
  ['Łódź – “3”', '?odz - "3"'],
  ['Café [1] {2} 5€', 'Café (1) (2) 5?'],
])('%s in the basic table is %s', (text, expected) => {
  expect(basicText(text)).toBe(expected);
});

test.each([
  ['abcdef', 6, 'abcdef'],
  ['abcdefg', 6, 'abc...'],
  ['abc', 2, '..'],
  ['abc', 0, ''],
])('%s cut to %i is %s', (text, longest, expected) => {
  expect(cutTo(text, longest)).toBe(expected);
});

test('plain words keep names and numbers as they are', () => {
  expect(plainWords('conductor M. Tolland, car 1412, 3.5 min')).toBe(
    'conductor M. Tolland, car 1412, 3.5 min',
  );
});

test('a silent sweep is told as a fact with what to do, and when it is over', () => {
  const since = Date.parse('2026-03-03T22:26:20Z');
  const silent = silenceWords({ since, isOver: false, pageUrl: 'https://stubpost.example/alerts' });
  expect(silent.subject).toBe('ACT NOW Stubpost raises no alerts: no sweep since 22:26:20 UTC');
  expect(silent.text).toContain('To do: watch the turns by radio');
  expect(silent.sms.length).toBeLessThanOrEqual(160);
  expect(silenceWords({ since, isOver: true, pageUrl: 'x' }).subject).toContain('raises alerts again');
});
