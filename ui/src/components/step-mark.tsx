import type { EntrySource, StepKind, StepState } from '@stubpost/shared';

/**
 * Class names of a step mark, for the board's picture and for `StepMark`: shape by kind, filling by state. What is known
 * by radio or was entered later is half filled.
 */
export function stepMarkClass(kind: StepKind, state: StepState, source: EntrySource | null = null): string {
  const isRelayed = source === 'by-radio' || source === 'entered-later';
  if (state === 'done') return `mark ${kind} ${isRelayed ? 'relayed' : 'done'}`;
  if (state === 'not-due' || state === 'due') return `mark ${kind}`;
  if (state === 'in-question') return `mark ${kind} in-question${isRelayed ? ' relayed' : ' done'}`;
  return `mark ${kind} ${state}`;
}

export interface StepMarkProps {
  kind: StepKind;
  state: StepState;
  /** How a recorded step is known; half filled when not first-hand. */
  source?: EntrySource | null;
  /** Edge length in CSS pixels, 14 by default. */
  size?: number;
}

/** The mark of a step. It is hidden from assistive technology: label and state stand beside it in words. */
export function StepMark({ kind, state, source = null, size }: StepMarkProps) {
  const style = size === undefined ? undefined : { width: size, height: size };
  return <span className={stepMarkClass(kind, state, source)} style={style} aria-hidden="true" />;
}
