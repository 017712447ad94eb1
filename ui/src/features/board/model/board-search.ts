import { TURN_STATES, formatInstant, parseInstant, type TurnState } from '@stubpost/shared';
import { SPANS, type Span } from './time-window';

export const VIEWS = ['timeline', 'table'] as const;
export type View = (typeof VIEWS)[number];

/** What a row stands for. The picture has no order by departure: its rows are tracks or sets. */
export const GROUPINGS = ['departure', 'track', 'set'] as const;
export type Grouping = (typeof GROUPINGS)[number];

export interface TurnFilter {
  text: string;
  states: TurnState[];
  needsAction: boolean;
}

/** Everything about the board that a link must carry. */
export interface BoardView {
  view: View;
  by: Grouping;
  span: Span;
  /** Start of the window; null follows now. */
  startAt: number | null;
  filter: TurnFilter;
}

export const noFilter: TurnFilter = { text: '', states: [], needsAction: false };

const usualSpan: Span = 120;

const oneOf = <Value extends string>(known: readonly Value[], text: string | null): Value | null =>
  known.find((value) => value === text) ?? null;

/** Reads a board's view out of the query of its address. What cannot be read counts as not given. */
export function parseBoardView(query: URLSearchParams): BoardView {
  const view = oneOf(VIEWS, query.get('view')) ?? 'timeline';
  return {
    view,
    by: parseGrouping(query.get('by'), view),
    span: parseSpan(query.get('span')),
    startAt: parseInstant(query.get('at') ?? ''),
    filter: {
      text: query.get('q') ?? '',
      states: TURN_STATES.filter((state) => (query.get('state') ?? '').split(',').includes(state)),
      needsAction: query.get('needs') === 'action',
    },
  };
}

/** Writes a view into a query; what is usual is left out, so that the plain address is the plain board. */
export function formatBoardView(view: BoardView): URLSearchParams {
  const query = new URLSearchParams();
  if (view.view !== 'timeline') query.set('view', view.view);
  if (view.by !== usualGrouping(view.view)) query.set('by', view.by);
  if (view.span !== usualSpan) query.set('span', String(view.span));
  if (view.startAt !== null) query.set('at', formatInstant(view.startAt));
  if (view.filter.text !== '') query.set('q', view.filter.text);
  if (view.filter.states.length > 0) query.set('state', view.filter.states.join(','));
  if (view.filter.needsAction) query.set('needs', 'action');
  return query;
}

/** The groupings that a view offers. */
export function groupingsOf(view: View): readonly Grouping[] {
  return view === 'table' ? GROUPINGS : ['track', 'set'];
}

function usualGrouping(view: View): Grouping {
  return view === 'table' ? 'departure' : 'track';
}

function parseGrouping(text: string | null, view: View): Grouping {
  return oneOf(groupingsOf(view), text) ?? usualGrouping(view);
}

function parseSpan(text: string | null): Span {
  if (text === 'day') return 'day';
  const minutes = Number(text);
  const shortest = SPANS[0] / 2;
  return Number.isInteger(minutes) && minutes >= shortest && minutes <= 36 * 60 ? minutes : usualSpan;
}
