import { type TurnFacts, type Instant, attendanceAt, gapWords, secondsBetween } from '@stubpost/shared';

/** Where an alert is: "Track 3, train 1742". */
export function subjectWords({ track, planned }: TurnFacts): string {
  const train = planned.outboundTrain ?? planned.inboundTrain ?? '';
  return track === null ? `Train ${train}` : `Track ${track}, train ${train}`;
}

/**
 * How long a train was unsecured by its record, once it is over. An entry that came in late may show that it never
 * was: then the gap is 0 s.
 */
export function closedGapWords(facts: TurnFacts, now: Instant): string {
  const ends = facts.entries.map((entry) => entry.observedAt).filter((at) => at <= now);
  for (const end of ends.reverse()) {
    const since = attendanceAt(facts, end - 1).unsecuredSince;
    if (since !== null) return `Gap: ${gapWords(secondsBetween(since, end))}`;
  }
  return `Gap: ${gapWords(0)}`;
}
