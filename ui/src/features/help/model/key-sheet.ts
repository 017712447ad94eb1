/** One line of the sheet: keys that do one thing or its two directions. */
export interface KeyLine {
  /** As they are written on the keyboard. */
  keys: readonly string[];
  does: string;
  /** Where the same thing is done by pointing. */
  button: string;
  /** Single signs: they can be switched off, and work only where the group says. */
  isLetter?: boolean;
}

export interface KeyGroup {
  where: string;
  lines: readonly KeyLine[];
}

/** Keys of the turn list; held against the board's own table of keys by a test. */
export const TURN_LIST_KEYS: KeyGroup = {
  where: 'In the turn list of the board',
  lines: [
    { keys: ['↑', '↓'], does: 'Turn by turn', button: 'The row' },
    { keys: ['Home', 'End'], does: 'First or last turn', button: 'The row' },
    { keys: ['PgUp', 'PgDn'], does: 'Ten turns up or down', button: 'The row' },
    {
      keys: ['←', '→'],
      does: 'Step by step within the turn',
      button: 'The step, in the table or in the turn',
    },
    { keys: ['Enter'], does: 'Open the turn', button: 'The row' },
    { keys: ['Space'], does: 'Record the step', button: 'Record, in the turn' },
    { keys: ['R'], does: 'Record what came by radio', button: 'Record, in the turn', isLetter: true },
    { keys: ['N'], does: 'Write a note', button: 'Note, in the turn', isLetter: true },
    { keys: ['T'], does: 'Take the alert', button: 'Take, in the alert strip', isLetter: true },
    { keys: ['S'], does: 'Set the alert aside', button: 'Set aside, on the alerts page', isLetter: true },
    { keys: ['M'], does: 'Move to another track', button: 'Track, in the turn', isLetter: true },
    { keys: ['W'], does: 'Swap the set', button: 'Set, in the turn', isLetter: true },
    { keys: ['[', ']'], does: 'Earlier, later', button: 'Earlier, Later', isLetter: true },
    { keys: ['+', '-'], does: 'Show less time, more time', button: '1 h to Day', isLetter: true },
    { keys: ['0'], does: 'Back to now', button: 'Now', isLetter: true },
  ],
};

/** Every key there is. Each has a visible button as well. */
export const KEY_GROUPS: readonly KeyGroup[] = [
  {
    where: 'On every page of the desk',
    lines: [
      {
        keys: ['Ctrl', 'K'],
        does: 'Find a turn by train, set, car, person or track',
        button: 'Find, in the top bar',
      },
      { keys: ['?'], does: 'This page', button: 'Keys, at the foot', isLetter: true },
    ],
  },
  TURN_LIST_KEYS,
  {
    where: 'In an open turn',
    lines: [
      { keys: ['Esc'], does: 'Close it and go back to its row', button: 'Close' },
      { keys: ['R'], does: 'Record a step', button: 'Record', isLetter: true },
      { keys: ['N'], does: 'Write a note', button: 'Note', isLetter: true },
      { keys: ['M'], does: 'Move to another track', button: 'Track', isLetter: true },
      { keys: ['W'], does: 'Swap the set', button: 'Set', isLetter: true },
    ],
  },
  {
    where: 'In the list of alerts',
    lines: [
      { keys: ['↑', '↓'], does: 'Alert by alert', button: 'The row' },
      { keys: ['Home', 'End'], does: 'First or last alert', button: 'The row' },
      { keys: ['Enter'], does: 'Open the turn', button: 'Open turn' },
      { keys: ['T'], does: 'Take the alert', button: 'Take', isLetter: true },
      { keys: ['S'], does: 'Set the alert aside', button: 'Set aside', isLetter: true },
    ],
  },
];
