import type { WireTurnMatters } from '@stubpost/shared';
import { clockText } from '../../../lib/turn/time-text';
import type { TurnNow } from '../../../lib/turn/turn-now';

type Each<Field extends keyof WireTurnMatters> =
  NonNullable<WireTurnMatters[Field]> extends (infer One)[] ? One : never;

/** A line about something that people reported, with the id of its entry. */
export interface ReportedLine {
  id: string;
  words: string;
}

/** What people reported about the turn beside its steps: bad orders, reliefs, tie-up, answers that are missing. */
export function reportedLines({ matters, steps, zone }: TurnNow): ReportedLine[] {
  const clock = (text: string): string => clockText(Date.parse(text), zone);
  const { defects = [], reliefs = [], asksAgreement = [], tiedUp } = matters;
  return [
    ...defects.map((defect) => ({ id: defect.entryId, words: `${clock(defect.at)} ${defectText(defect)}` })),
    ...reliefs.map((relief) => ({ id: relief.entryId, words: `${clock(relief.at)} ${reliefText(relief)}` })),
    ...(tiedUp ? [{ id: tiedUp.entryId, words: `${clock(tiedUp.at)} ${tieUpText(tiedUp)}` }] : []),
    ...asksAgreement.map(({ entryId, step, at }) => {
      const label = steps.find((each) => each.key === step)?.shortLabel ?? step;
      return { id: entryId, words: `${label} ${clock(at)} by radio: no word from the crew yet` };
    }),
  ];
}

const byWords = (by: string | null): string => (by === null ? '' : ` (${by})`);

function defectText({ car, cause, note, by }: Each<'defects'>): string {
  const more = note === undefined ? '' : `: ${note}`;
  return `Bad order, ${car === null ? 'the set' : `car ${car}`}, ${cause}${more}${byWords(by)}`;
}

function reliefText(relief: Each<'reliefs'>): string {
  const { out, in: comes, as, faceToFace, awaits } = relief;
  if (comes === null) return `${out.name} relieved as ${as}, nobody took over`;
  const missing = [out, comes].find((person) => person.personId === awaits);
  const unsaid = missing === undefined ? 'not face to face' : `face to face, ${missing.name} to confirm`;
  return `${out.name} relieved as ${as} by ${comes.name}, ${faceToFace ? 'face to face' : unsaid}`;
}

function tieUpText({
  handbrakes,
  checks,
  offAir,
  reason,
  by,
}: NonNullable<WireTurnMatters['tiedUp']>): string {
  const { count, cars } = handbrakes;
  const parts = [
    `Tied up, ${count} ${count === 1 ? 'handbrake' : 'handbrakes'} set${cars.length === 0 ? '' : `: ${cars.join(', ')}`}`,
    checks.length === 0 ? '' : `looked after: ${checks.join(', ')}`,
    offAir === true ? 'cut off from air' : '',
    reason === undefined ? '' : `reason: ${reason}`,
  ];
  return `${parts.filter(Boolean).join('; ')}${byWords(by)}`;
}
