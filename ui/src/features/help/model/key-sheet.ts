/** One key as the sheet lists it. */
export interface KeyLine {
  keys: readonly string[];
  does: string;
  /** Where the same thing is done by pointing. */
  button: string;
  /** A single letter or sign: can be switched off, and works only where the group says. */
  isLetter?: boolean;
}

export interface KeyGroup {
  where: string;
  lines: readonly KeyLine[];
}

/** Every key there is. Each has a visible button; letters work only while the turn list has the focus. */
export const KEY_GROUPS: readonly KeyGroup[] = [
  {
    where: 'On every page',
    lines: [
      {
        keys: ['Ctrl', 'K'],
        does: 'Find a turn by train, set, car, person or track',
        button: 'Find, in the top bar',
      },
      { keys: ['?'], does: 'This page', button: 'Keys, at the foot of every page', isLetter: true },
      { keys: ['Tab'], does: 'Next control; the turn list is one stop', button: '–' },
    ],
  },
  {
    where: 'In the turn list of the board',
    lines: [
      { keys: ['↑', '↓'], does: 'Turn by turn', button: 'the row itself' },
      { keys: ['Home', 'End'], does: 'First or last turn', button: 'the row itself' },
      { keys: ['PgUp', 'PgDn'], does: 'Ten turns back or on', button: 'the row itself' },
      { keys: ['←', '→'], does: 'Step by step within the turn', button: 'the mark itself' },
      { keys: ['Enter'], does: 'Open the turn', button: 'the row itself' },
      { keys: ['Esc'], does: 'Close the turn and go back to its row', button: 'Close, in the turn' },
    ],
  },
];
