import { formatBoardView, parseBoardView, type BoardView } from './board-search';

const plain: BoardView = {
  view: 'timeline',
  by: 'track',
  span: 120,
  startAt: null,
  filter: { text: '', states: [], needsAction: false },
};

describe('the address of a board', () => {
  it('is bare for the plain board', () => {
    expect(formatBoardView(plain).toString()).toBe('');
    expect(parseBoardView(new URLSearchParams())).toEqual(plain);
  });

  it.each<[string, BoardView]>([
    ['a table in order of departure', { ...plain, view: 'table', by: 'departure' }],
    ['a table by set', { ...plain, view: 'table', by: 'set' }],
    ['the day by set', { ...plain, by: 'set', span: 'day' }],
    ['a stretch in the past', { ...plain, span: 240, startAt: Date.parse('2026-03-03T10:00:00Z') }],
    [
      'a filter with an ampersand',
      { ...plain, filter: { text: 'A&B 17', states: ['arrived', 'ready'], needsAction: true } },
    ],
  ])('carries %s there and back', (_name, view) => {
    expect(parseBoardView(new URLSearchParams(formatBoardView(view).toString()))).toEqual(view);
  });

  it('passes over what it cannot read', () => {
    const odd = new URLSearchParams('view=chart&by=colour&span=7&at=noon&state=lost,arrived');
    expect(parseBoardView(odd)).toEqual({ ...plain, filter: { ...plain.filter, states: ['arrived'] } });
  });

  it('has no order by departure in the picture, whose rows are tracks or sets', () => {
    expect(parseBoardView(new URLSearchParams('by=departure')).by).toBe('track');
  });
});
