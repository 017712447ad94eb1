import { idSchema } from '@stubpost/shared';
import { describe, expect, it } from 'vitest';
import { entryIdOf } from './entry-id';

describe('ids of the demo’s entries', () => {
  it('are UUIDs that the service takes', () => {
    expect(idSchema.safeParse(entryIdOf('turn arrival')).success).toBe(true);
  });

  it('are the same for the same act and differ for another', () => {
    expect(entryIdOf('turn arrival')).toBe(entryIdOf('turn arrival'));
    expect(entryIdOf('turn arrival')).not.toBe(entryIdOf('turn departure'));
  });
});
