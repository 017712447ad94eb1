import { describe, expect, it } from 'vitest';
import { sortAssets } from './keep-old-assets';

const day = 24 * 3600 * 1000;
const now = 100 * day;

describe('files of earlier builds', () => {
  it('stay for 30 days after they were last part of the newest build, and not longer', () => {
    const present = ['a-new.js', 'a-last.js', 'a-edge.js', 'a-old.js', 'a-unknown.js'];
    const lastUsed = { 'a-last.js': now - day, 'a-edge.js': now - 30 * day, 'a-old.js': now - 30 * day - 1 };
    const { kept, gone } = sortAssets({ present, current: new Set(['a-new.js']), lastUsed }, now);
    expect(gone).toEqual(['a-old.js']);
    expect(kept).toEqual({
      'a-new.js': now,
      'a-last.js': now - day,
      'a-edge.js': now - 30 * day,
      'a-unknown.js': now,
    });
  });

  it('begin their days anew when a later build uses them again', () => {
    const { kept } = sortAssets(
      { present: ['a.js'], current: new Set(['a.js']), lastUsed: { 'a.js': now - 40 * day } },
      now,
    );
    expect(kept).toEqual({ 'a.js': now });
  });
});
