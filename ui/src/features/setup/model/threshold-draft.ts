import type { TerminalThresholds } from '@stubpost/shared';

type NumberThreshold = Exclude<keyof TerminalThresholds, 'onTimeInclusive'>;

/** One threshold of the form: its words, its unit, its limits. */
export interface ThresholdField {
  key: NumberThreshold;
  label: string;
  hint: string;
  unit: 's' | 'min';
  lowest: number;
  highest: number;
}

/** The thresholds in the order of the form. Limits are those of the wire. */
export const thresholdFields: readonly ThresholdField[] = [
  {
    key: 'onTimeSeconds',
    label: 'On time up to',
    hint: 'Seconds past the scheduled departure that still count as on time. Printed beside every percentage.',
    unit: 's',
    lowest: 0,
    highest: 3600,
  },
  {
    key: 'runningTestMinutes',
    label: 'Running brake test within',
    hint: 'Minutes after the departure without a record until an alert is raised.',
    unit: 'min',
    lowest: 1,
    highest: 240,
  },
  {
    key: 'noWordMinutes',
    label: 'No word after',
    hint: 'Minutes past the due time of the next step or the arrival without any entry or feed message.',
    unit: 'min',
    lowest: 1,
    highest: 120,
  },
  {
    key: 'raiseHoldSeconds',
    label: 'Raise a late departure after',
    hint: 'Seconds that the slack must have been below 0.',
    unit: 's',
    lowest: 0,
    highest: 600,
  },
  {
    key: 'clearSlackSeconds',
    label: 'Clear it from a slack of',
    hint: 'Seconds to spare from which the alert is cleared.',
    unit: 's',
    lowest: 0,
    highest: 1800,
  },
  {
    key: 'clearHoldSeconds',
    label: 'Clear it after',
    hint: 'Seconds that the slack must have been enough.',
    unit: 's',
    lowest: 0,
    highest: 600,
  },
];

/** Thresholds while they are edited. */
export type ThresholdDraft = Record<NumberThreshold, string> & { onTimeInclusive: boolean };

/** Thresholds, ready to be edited. */
export function draftOfThresholds(thresholds: TerminalThresholds): ThresholdDraft {
  const { onTimeInclusive, ...numbers } = thresholds;
  const {
    onTimeSeconds,
    runningTestMinutes,
    noWordMinutes,
    raiseHoldSeconds,
    clearHoldSeconds,
    clearSlackSeconds,
  } = numbers;
  return {
    onTimeInclusive,
    onTimeSeconds: String(onTimeSeconds),
    runningTestMinutes: String(runningTestMinutes),
    noWordMinutes: String(noWordMinutes),
    raiseHoldSeconds: String(raiseHoldSeconds),
    clearHoldSeconds: String(clearHoldSeconds),
    clearSlackSeconds: String(clearSlackSeconds),
  };
}

/** Thresholds as typed, and what is wrong with them in the order of the form. */
export function readThresholds(draft: ThresholdDraft): {
  thresholds: TerminalThresholds;
  problems: { field: NumberThreshold; words: string }[];
} {
  const problems: { field: NumberThreshold; words: string }[] = [];
  const read = (key: NumberThreshold): number => {
    const field = thresholdFields.find((each) => each.key === key);
    const typed = draft[key].trim();
    const value = Number(typed);
    if (field === undefined) return value;
    if (typed !== '' && Number.isInteger(value) && value >= field.lowest && value <= field.highest)
      return value;
    problems.push({
      field: key,
      words: `${field.label}: a whole number from ${field.lowest} to ${field.highest}.`,
    });
    return field.lowest;
  };
  const thresholds = {
    onTimeInclusive: draft.onTimeInclusive,
    onTimeSeconds: read('onTimeSeconds'),
    runningTestMinutes: read('runningTestMinutes'),
    noWordMinutes: read('noWordMinutes'),
    raiseHoldSeconds: read('raiseHoldSeconds'),
    clearSlackSeconds: read('clearSlackSeconds'),
    clearHoldSeconds: read('clearHoldSeconds'),
  };
  return { thresholds, problems };
}
