import { screen } from '@testing-library/react';
import { button, conductor, openTurn, secured, standingClock, touch } from '../testing/turn-page';

standingClock();

describe('a tie-up half filled in', () => {
  it('is still there after a look at the defects', async () => {
    await openTurn({ ...secured, outbound: null }, conductor, [], { isTieUp: true });
    await touch('Doors');
    await touch('Cut off');
    await touch('Report a defect');
    expect(screen.queryByRole('button', { name: 'Doors' })).toBeNull();
    await touch('Back');
    expect(button('Doors')).toHaveAttribute('aria-pressed', 'true');
    expect(button('Lights')).toHaveAttribute('aria-pressed', 'false');
    expect(button('Cut off')).toHaveAttribute('aria-pressed', 'true');
  });
});
