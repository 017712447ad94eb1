import { diffItems } from './diff-items';
import type { PictureItem } from './picture-scene';

const item = (id: string, change: Partial<PictureItem> = {}): PictureItem => ({
  id,
  group: 'track-3-work',
  type: 'range',
  start: 0,
  end: 10,
  className: 'work',
  content: '',
  ...change,
});
const drawn = (...items: PictureItem[]) => new Map(items.map((one) => [one.id, one]));

describe('what changes from one drawing to the next', () => {
  it('is nothing when nothing changed', () => {
    expect(diffItems(drawn(item('a'), item('b')), [item('a'), item('b')])).toEqual({
      changed: [],
      removed: [],
    });
  });

  it('is only what is new, moved, renamed or gone', () => {
    const after = [item('a'), item('b', { end: 11 }), item('c', { className: 'work short' }), item('d')];
    const { changed, removed } = diffItems(drawn(item('a'), item('b'), item('c'), item('x')), after);
    expect(changed.map((one) => one.id)).toEqual(['b', 'c', 'd']);
    expect(removed).toEqual(['x']);
  });
});
