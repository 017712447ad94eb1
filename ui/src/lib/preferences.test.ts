import { expect, test } from 'vitest';
import { forgetPreferences, readPreferences, setPreferences } from './preferences';

test('preferences are kept for the next visit', () => {
  setPreferences({ theme: 'dark', letterKeys: false });
  forgetPreferences();
  expect(readPreferences()).toMatchObject({ theme: 'dark', letterKeys: false, noColour: false });
});

test.each(['no JSON', 'null', '[]', '{"theme":"green","announceSeconds":1,"announce":3}'])(
  'what cannot be read falls back to what is shipped: %s',
  (kept) => {
    localStorage.setItem('stubpost.preferences', kept);
    forgetPreferences();
    expect(readPreferences()).toEqual({
      theme: 'system',
      noColour: false,
      announce: 'all',
      announceSeconds: 10,
      letterKeys: true,
    });
  },
);
