import { render } from '@testing-library/react';
import { clockAt } from '../../../testing/wire-turn';
import type { PictureItem } from '../model/picture-scene';
import { TimelinePicture, type TimelinePictureProps } from './timeline-picture';

const now = clockAt('17:26:40');
const work: PictureItem = {
  id: 'turn-1 work',
  group: 'track-3-work',
  type: 'range',
  start: clockAt('17:19:10'),
  end: now,
  className: 'work short',
  content: '',
};
const flag: PictureItem = {
  id: 'turn-1 flag',
  group: 'track-3-work',
  type: 'point',
  start: clockAt('17:38'),
  className: 'flag annulled',
  content: 'Annulled, <b onclick="x()">no</b> crew',
};
const props = (change: Partial<TimelinePictureProps> = {}): TimelinePictureProps => ({
  rowIds: ['track-3'],
  items: [work, flag],
  window: { from: clockAt('17:06:40'), to: clockAt('19:06:40') },
  now,
  zone: 'America/New_York',
  clock: '17:26:40',
  pixelsPerMinute: 9.2,
  onWidth: () => undefined,
  onDrag: () => undefined,
  onPick: () => undefined,
  ...change,
});

describe('the picture', () => {
  it('is hidden from assistive technology and holds nothing that can have the focus', () => {
    const { container } = render(<TimelinePicture {...props()} />);
    expect(container.firstElementChild).toHaveAttribute('aria-hidden', 'true');
    expect(container.querySelectorAll('button, a, input, select, [tabindex="0"]')).toHaveLength(0);
  });

  it('lets no markup of a reason through', () => {
    const { container } = render(<TimelinePicture {...props()} />);
    expect(container.querySelector('[onclick]')).toBeNull();
  });

  it('makes one timeline and takes it away with itself', () => {
    const { container, rerender, unmount } = render(<TimelinePicture {...props()} />);
    rerender(<TimelinePicture {...props({ now: now + 1000, items: [{ ...work, end: now + 1000 }] })} />);
    rerender(<TimelinePicture {...props({ now: now + 2000, rowIds: ['track-3', 'track-4'] })} />);
    expect(container.querySelectorAll('.vis-timeline')).toHaveLength(1);
    unmount();
    expect(document.querySelectorAll('.vis-timeline')).toHaveLength(0);
  });

  it('has no clock on the now line when now lies outside of it', () => {
    const { queryByText } = render(<TimelinePicture {...props({ clock: null })} />);
    expect(queryByText('17:26:40')).toBeNull();
  });
});
