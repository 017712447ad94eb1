import { expect, test } from 'vitest';
import { pageOrigin } from './environment';

test.each([
  ['http:', '192.168.1.20', true],
  ['http:', 'stubpost.railroad.example', true],
  ['http:', '127.0.0.1', false],
  ['http:', 'localhost', false],
  ['http:', '[::1]', false],
  ['https:', 'stubpost.railroad.example', false],
])('a page from %s//%s is unencrypted: %s', (protocol, hostname, isUnencrypted) => {
  expect(pageOrigin({ protocol, hostname })).toEqual({ isUnencrypted });
});
