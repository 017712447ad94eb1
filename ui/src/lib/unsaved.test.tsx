import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { beforeAll, describe, expect, it } from 'vitest';
import { hasUnsaved, useUnsaved, watchFields } from './unsaved';

function Pad({ isBegun }: { isBegun: boolean }) {
  useUnsaved(isBegun);
  return null;
}

describe('what a new load would lose', () => {
  beforeAll(watchFields);

  it('is a field that was typed in, until it is empty or gone', async () => {
    const user = userEvent.setup({ delay: null });
    const { unmount } = render(<textarea aria-label="Note" />);
    expect(hasUnsaved()).toBe(false);
    await user.type(screen.getByLabelText('Note'), 'door 2');
    expect(hasUnsaved()).toBe(true);
    await user.clear(screen.getByLabelText('Note'));
    expect(hasUnsaved()).toBe(false);
    await user.type(screen.getByLabelText('Note'), 'door 2');
    unmount();
    expect(hasUnsaved()).toBe(false);
  });

  it('is not what is looked for', async () => {
    const user = userEvent.setup({ delay: null });
    render(<input type="search" aria-label="Find" />);
    await user.type(screen.getByLabelText('Find'), '1742');
    expect(hasUnsaved()).toBe(false);
  });

  it('is no form that was sent', async () => {
    const user = userEvent.setup({ delay: null });
    render(
      <form onSubmit={(event) => event.preventDefault()}>
        <input aria-label="Name" />
        <button>Save</button>
      </form>,
    );
    await user.type(screen.getByLabelText('Name'), 'Ortiz');
    expect(hasUnsaved()).toBe(true);
    await user.click(screen.getByRole('button', { name: 'Save' }));
    expect(hasUnsaved()).toBe(false);
  });

  it('is what a part without fields says of itself', () => {
    const { rerender, unmount } = render(<Pad isBegun={false} />);
    expect(hasUnsaved()).toBe(false);
    rerender(<Pad isBegun />);
    expect(hasUnsaved()).toBe(true);
    unmount();
    expect(hasUnsaved()).toBe(false);
  });
});
