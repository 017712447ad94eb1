import { render, screen } from '@testing-library/react';
import { expect, onTestFinished, test } from 'vitest';
import { replaceDeviceClock } from '../lib/use-now';
import { clockAt } from '../testing/wire-turn';
import { OtherZone } from './other-zone';

const terminal = { name: 'Quarry Street', zone: 'America/New_York' };

test('says whose clock counts when the device goes by another one', () => {
  onTestFinished(replaceDeviceClock(() => clockAt('17:00')));
  render(<OtherZone terminal={terminal} deviceZone="America/Chicago" />);
  expect(
    screen.getByText('All times are those of Quarry Street (EST). This device goes by CST.'),
  ).toBeInTheDocument();
});

test('says nothing when both clocks show the same, whatever the zones are called', () => {
  onTestFinished(replaceDeviceClock(() => clockAt('17:00')));
  const { container } = render(<OtherZone terminal={terminal} deviceZone="America/Toronto" />);
  expect(container).toBeEmptyDOMElement();
});
