/** What a board list is asked for: one terminal, and a service date or a span of instants (default: the service's). */
export interface BoardQuestion {
  terminal: string;
  serviceDate?: string;
  from?: string;
  to?: string;
  /** The span round now that a crew looks at; it moves with the clock, the list stays one. */
  span?: 'crew';
}

/** What an alert list is asked for; `state` is `standing` when absent. */
export interface AlertQuestion {
  terminal: string;
  state?: string;
}

/**
 * One root per area, written once, so that a change can reach everything it touches (`queryKeys.turns.all`). From
 * general to special; whatever a fetcher uses is in its key.
 */
export const queryKeys = {
  session: { all: ['session'] as const, list: ['own-sessions'] as const, badge: ['own-badge'] as const },
  setup: { all: ['set-up'] as const },
  demo: { all: ['demo'] as const },
  health: { all: ['health'] as const, sweep: ['health', 'sweep'] as const },
  links: { one: (token: string) => ['links', token] as const },
  people: { all: ['people'] as const },
  crew: { at: (terminal: string) => ['crew', terminal] as const },
  terminals: {
    all: ['terminals'] as const,
    settings: (terminal: string) => ['terminals', 'settings', terminal] as const,
  },
  turns: {
    all: ['turns'] as const,
    boards: ['turns', 'board'] as const,
    board: (question: BoardQuestion) => ['turns', 'board', question] as const,
    detail: (turnId: string) => ['turns', 'detail', turnId] as const,
    entries: (turnId: string) => ['turns', 'entries', turnId] as const,
  },
  alerts: {
    all: ['alerts'] as const,
    lists: ['alerts', 'list'] as const,
    list: (question: AlertQuestion) => ['alerts', 'list', question] as const,
    quality: (question: { terminal: string; from: string; to: string; afterwards: string }) =>
      ['alerts', 'quality', question] as const,
  },
  corrections: {
    all: ['corrections'] as const,
    list: (question: { terminal: string; state: string }) => ['corrections', 'list', question] as const,
  },
  log: { all: ['log'] as const, state: ['log', 'state'] as const, heads: ['log', 'heads'] as const },
  plans: { all: ['plans'] as const, detail: (planId: string) => ['plans', 'detail', planId] as const },
  sets: { all: ['sets'] as const },
  timetables: { all: ['timetables'] as const },
  history: { all: ['history'] as const },
  duty: { roster: (terminal: string) => ['duty', 'roster', terminal] as const },
  messages: { all: ['messages'] as const },
  takings: { one: (token: string) => ['takings', token] as const },
  find: { at: (terminal: string, text: string) => ['find', terminal, text] as const },
};
