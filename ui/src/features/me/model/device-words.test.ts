import { expect, test } from 'vitest';
import { deviceWords } from './device-words';

test.each([
  [
    'Mozilla/5.0 (X11; Linux x86_64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/156.0.0.0 Safari/537.36',
    'Chrome on Linux',
  ],
  [
    'Mozilla/5.0 (Windows NT 10.0; Win64; x64) AppleWebKit/537.36 Chrome/156.0.0.0 Safari/537.36 Edg/156.0',
    'Edge on Windows',
  ],
  [
    'Mozilla/5.0 (iPhone; CPU iPhone OS 19_0 like Mac OS X) AppleWebKit/605 Version/19.0 Mobile/15E148 Safari/604.1',
    'Safari on iPhone',
  ],
  ['Mozilla/5.0 (Macintosh; Intel Mac OS X 10.15; rv:150.0) Gecko/20100101 Firefox/150.0', 'Firefox on Mac'],
  [
    'Mozilla/5.0 (Linux; Android 16; SM-S931) AppleWebKit/537.36 SamsungBrowser/30.0 Chrome/150 Mobile Safari/537.36',
    'Samsung browser on Android',
  ],
  ['curl/8.5.0', 'curl/8.5.0'],
  ['', 'Unknown device'],
  ['x'.repeat(60), `${'x'.repeat(39)}…`],
])('%s is %s', (userAgent, words) => {
  expect(deviceWords(userAgent)).toBe(words);
});
