import type { WireDailyHead, WireLogState } from '@stubpost/shared';
import { formatStamp } from '../../../lib/time-display';

/** A count as people read it: "12,345". */
export const formatCount = (count: number): string => count.toLocaleString('en-US');

/** A running number: "no. 1,204". */
const no = (sequence: number): string => `no. ${formatCount(sequence)}`;

const entries = (count: number): string => `${formatCount(count)} ${count === 1 ? 'entry' : 'entries'}`;

/** The first twelve characters in groups of four, as they are read out: "9f3c 41d2 a07e". */
export const shortHash = (hash: string): string => (hash.slice(0, 12).match(/.{4}/g) ?? []).join(' ');

const took = (milliseconds: number): string => `${(milliseconds / 1000).toFixed(1)} s`;

/** How the chain stands, in words. */
export interface ChainWords {
  headline: string;
  /** One sentence each, the most important first. */
  lines: string[];
}

/** The state of the log in plain words; times in the zone of the terminal. */
export function chainWords({ chain, entries: count }: WireLogState, zone: string): ChainWords {
  const running =
    chain.runningTo === null ? [] : [`A check is running: ${no(chain.runningTo)} of ${formatCount(count)}.`];
  if (chain.state === 'waiting' || chain.checkedAt === null || (chain.checkedTo === 0 && count > 0))
    return {
      headline: count === 0 ? 'No entry yet' : 'Not checked yet',
      lines: running.length > 0 ? running : ['The first check since the server was started has not ended.'],
    };
  const when = `checked ${formatStamp(chain.checkedAt, zone)} in ${took(chain.tookMilliseconds ?? 0)}`;
  const since = count - chain.checkedTo;
  const later = since > 0 ? [`${entries(since)} came in since and will be in the next check.`] : [];
  if (chain.state === 'broken') {
    const first = chain.faults.find(({ sequence }) => sequence !== null)?.sequence;
    return {
      headline: first === undefined || first === null ? 'Chain broken' : `Chain broken at ${no(first)}`,
      lines: [`${entries(chain.checkedTo)}, ${when}. ${faults(chain.faultCount)}`, ...later, ...running],
    };
  }
  const seen = chain.checkedTo === 0 ? 'No entry yet' : `${entries(chain.checkedTo)} from no. 1`;
  return { headline: 'Chain whole', lines: [`${seen}, ${when}.`, ...later, ...running] };
}

const faults = (count: number): string =>
  count === 1 ? 'One thing is wrong.' : `${formatCount(count)} things are wrong.`;

/** From which to which number a day's entries run: "no. 47,688 to 48,311". */
export function numbersOfDay({ sequence, entries: count }: WireDailyHead): string {
  const first = sequence - count + 1;
  return first === sequence ? no(sequence) : `${no(first)} to ${formatCount(sequence)}`;
}
