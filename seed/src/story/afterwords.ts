import { addSeconds, type Instant } from '@stubpost/shared';
import { randomOf } from '../railroad/random';
import type { Act } from './act';

/** How often a crew answers what the desk wrote by radio, and how often it asks for a time to be corrected. Our choice. */
const chances = { agrees: 0.85, slips: 0.02 };
/** When a conductor finds the time to look at the record again after leaving. */
const asksAfterSeconds = 900;
const slippable = ['handbrake-set', 'cab-brake-check'];
const reasons = ['wrong time: touched the bar a car later', 'wrong time: had the glove on, touched late'];

/** What there is to say about a turn once it was worked. */
export interface Afterwords {
  /** Names the turn, so that the same one is always told the same. */
  name: string;
  acts: readonly Act[];
  departedAt: Instant | null;
}

/** What the conductor says to the record afterwards: that the desk heard right, or that a time is wrong. */
export function afterwordsOf({ name, acts, departedAt }: Afterwords): Act[] {
  const agreed = acts.flatMap((act) => agreementTo(act, name));
  return departedAt === null ? agreed : [...agreed, ...correctionIn(acts, departedAt, name)];
}

const byConductor = (at: Instant, content: Act['content']): Act => ({
  observedAt: at,
  toldAt: addSeconds(at, 2),
  teller: 'conductor',
  source: 'by-hand',
  content,
});

function agreementTo({ source, toldAt, content }: Act, name: string): Act[] {
  if (source !== 'by-radio' || content.kind !== 'step-done') return [];
  const random = randomOf(`agrees|${name}|${content.step}`);
  if (random.next() >= chances.agrees) return [];
  const at = wholeSeconds(addSeconds(toldAt, 20 + 60 * random.next()));
  return [byConductor(at, { kind: 'agreed', step: content.step })];
}

function correctionIn(acts: readonly Act[], departedAt: Instant, name: string): Act[] {
  const random = randomOf(`slips|${name}`);
  if (random.next() >= chances.slips) return [];
  const step = slippable[Math.floor(random.next() * slippable.length)];
  const act = acts.find(
    ({ source, content }) => source === 'by-hand' && content.kind === 'step-done' && content.step === step,
  );
  if (act === undefined || step === undefined) return [];
  const correctedAt = wholeSeconds(addSeconds(act.observedAt, -20 - 25 * random.next()));
  const reason = reasons[Math.floor(random.next() * reasons.length)] ?? 'wrong time';
  return [
    byConductor(addSeconds(departedAt, asksAfterSeconds), { kind: 'corrected', step, correctedAt, reason }),
  ];
}

const wholeSeconds = (instant: Instant): Instant => Math.round(instant / 1000) * 1000;
