import type { Instant } from '../lib/instant';
import type { MailWords } from './alert-message';

/** What is said about a sweep that stays away. Times in UTC, for it concerns every terminal. */
export interface SweepSilence {
  since: Instant;
  isOver: boolean;
  pageUrl: string;
}

const clockOf = (instant: Instant): string => `${new Date(instant).toISOString().slice(11, 19)} UTC`;

/** Mail and text message that the alert sweep is silent, or that it runs again. */
export function silenceWords({ since, isOver, pageUrl }: SweepSilence): MailWords & { sms: string } {
  const clock = clockOf(since);
  if (isOver) {
    const text = `Alerts are raised again. There was no sweep from ${clock} on; what stands is on the page of alerts.`;
    return {
      subject: `Stubpost raises alerts again (silent from ${clock})`,
      text: `${text}\n\n${pageUrl}`,
      sms: `STUBPOST raises alerts again (silent from ${clock})`,
    };
  }
  const text = [
    `No alert sweep since ${clock}. Until it runs again no alert is raised and none is cleared.`,
    'To do: watch the turns by radio and the timetable; have somebody look at the server.',
    'This message comes from a timer of its own, not from the sweep.',
    '',
    pageUrl,
  ].join('\n');
  return {
    subject: `ACT NOW Stubpost raises no alerts: no sweep since ${clock}`,
    text,
    sms: `STUBPOST raises no alerts: no sweep since ${clock}. Watch by radio; look at the server`,
  };
}
