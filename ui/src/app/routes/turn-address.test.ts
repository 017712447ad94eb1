import { boardAddress, fullPageAddress, panelAddress } from './turn-address';

describe('addresses of a turn and its board', () => {
  it('carry the board’s view through the panel and back', () => {
    const board = new URLSearchParams('view=table&q=17');
    const panel = panelAddress('t-1', 'VAR', board);
    expect(panel).toBe('/turns/t-1?view=table&q=17&terminal=VAR');
    expect(boardAddress('VAR', new URLSearchParams(panel.split('?')[1]))).toBe('/board/VAR?view=table&q=17');
  });

  it('lead from the full page to the plain board', () => {
    const full = fullPageAddress('t-1', 'VAR');
    expect(boardAddress('VAR', new URLSearchParams(full.split('?')[1]))).toBe('/board/VAR');
  });
});
