import type { WireTurn } from '@stubpost/shared';
import { formatServiceTime } from '../../../lib/time-display';
import { hasLeft } from './next-act';
import { openAfterDeparture, progressOf } from './my-turns';
import { leavesAt } from './turn-times';

/** A turn in the two lines of a list. */
export interface TurnLine {
  /** "17:18 to 17:40, Track 3" */
  when: string;
  /** "1741 in, 1742 out, set 41" */
  trains: string;
  /** "1 of 8 done", or nothing before anything is recorded and where there is nothing to record. */
  progress: string;
}

/** The words of a turn in a list. Times without seconds, with the service day's night named after midnight. */
export function turnLine(turn: WireTurn): TurnLine {
  const { recorded, asked } = progressOf(turn);
  const isUnderWay = recorded > 0 || (turn.inbound?.actualArrivalAt ?? null) !== null;
  return {
    when: `${timesOf(turn)}, ${turn.track === null ? 'no track yet' : `Track ${turn.track}`}`,
    trains: trainsOf(turn),
    progress: asked > 0 && isUnderWay ? `${recorded} of ${asked} done` : '',
  };
}

function timesOf(turn: WireTurn): string {
  const time = (text: string): string => formatServiceTime(text, turn.zone, turn.serviceDate);
  const { inbound, outbound } = turn;
  if (outbound !== null && outbound.actualDepartureAt !== null)
    return `${time(outbound.actualDepartureAt)} left`;
  const leaves = leavesAt(turn);
  const comes =
    inbound === null
      ? null
      : (inbound.actualArrivalAt ?? inbound.expectedArrivalAt ?? inbound.scheduledArrivalAt);
  if (comes === null) return leaves === null ? '' : `leaves ${time(leaves)}`;
  return leaves === null ? time(comes) : `${time(comes)} to ${time(leaves)}`;
}

function trainsOf({ inbound, outbound, set }: WireTurn): string {
  const parts = [
    inbound === null ? 'first train out' : `${inbound.train} in`,
    outbound === null ? 'stays, tie-up' : `${outbound.train} out`,
    ...(set === null ? [] : [`set ${set}`]),
  ];
  return parts.join(', ');
}

/** What is open after the departure: "1 open"; null when nothing is, or the train has not left. */
export function openWords(turn: WireTurn): string | null {
  const open = openAfterDeparture(turn);
  return hasLeft(turn) && open > 0 ? `${open} open` : null;
}
