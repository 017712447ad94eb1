import { act, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, test, vi } from 'vitest';
import { ApiError } from '../lib/api-client';
import { BlueSignalFlag, HealthFlag, PriorityMark, StateWord } from './flags';
import { ErrorState, LoadingRows } from './page-states';
import { faultCode, PartBoundary } from './part-boundary';
import { stepMarkClass } from './step-mark';

afterEach(() => {
  vi.useRealTimers();
  vi.restoreAllMocks();
});

describe('a step mark', () => {
  test.each([
    ['not-due', null, 'mark air'],
    ['due', null, 'mark air'],
    ['done', 'by-hand', 'mark air done'],
    ['done', 'by-feed', 'mark air done'],
    ['done', 'by-radio', 'mark air relayed'],
    ['done', 'entered-later', 'mark air relayed'],
    ['overdue', null, 'mark air overdue'],
    ['not-needed', null, 'mark air not-needed'],
    ['withdrawn', null, 'mark air withdrawn'],
    ['blocked', null, 'mark air blocked'],
    ['in-question', 'by-hand', 'mark air in-question done'],
    ['in-question', 'by-radio', 'mark air in-question relayed'],
  ] as const)('in state %s, known %s, is drawn as "%s"', (state, source, classes) => {
    expect(stepMarkClass('air', state, source)).toBe(classes);
  });
});

describe('flags', () => {
  test('say the word beside shape and colour, and nothing on plan', () => {
    const { container } = render(
      <>
        <HealthFlag health="short" />
        <HealthFlag health="late" detail="3 min" />
        <HealthFlag health="on-plan" />
        <PriorityMark priority="act-now" />
        <PriorityMark priority="watch" over />
        <StateWord state="annulled" />
        <BlueSignalFlag words="Blue signal up since 17:12" />
      </>,
    );
    expect([...container.querySelectorAll('.flag')].map(({ textContent }) => textContent)).toEqual([
      'Short',
      'Late 3 min',
      'Act now',
      'Watch',
      'Annulled',
      'Blue signal up since 17:12',
    ]);
  });
});

describe('loading', () => {
  test('keeps the place of the rows and offers to try again after four seconds', async () => {
    vi.useFakeTimers();
    const onRetry = vi.fn();
    const { container } = render(<LoadingRows what="turns for Tue 3 Mar" rows={3} onRetry={onRetry} />);
    expect(screen.getByRole('status')).toHaveTextContent('Loading turns for Tue 3 Mar');
    expect(container.querySelector('[aria-hidden]')?.children).toHaveLength(3);
    expect(screen.queryByRole('button')).not.toBeInTheDocument();
    act(() => {
      vi.advanceTimersByTime(4000);
    });
    expect(screen.getByRole('status')).toHaveTextContent('Still loading');
    vi.useRealTimers();
    await userEvent.click(screen.getByRole('button', { name: 'Retry' }));
    expect(onRetry).toHaveBeenCalledOnce();
  });
});

test('an error says why and the number for the log', () => {
  const error = new ApiError({ status: 500, code: 'server.fault', message: 'x', requestId: 'r-7' });
  render(<ErrorState error={error} />);
  expect(screen.getByRole('alert')).toHaveTextContent('The server could not do this. Nothing was changed.');
  expect(screen.getByRole('alert')).toHaveTextContent('Number for the log: r-7');
});

describe('a part that breaks', () => {
  let isBroken = true;
  function Fragile() {
    if (isBroken) throw new Error('no such track');
    return <p>Steps</p>;
  }

  test('says so with a code, leaves the rest standing, and can be drawn anew', async () => {
    vi.spyOn(console, 'error').mockImplementation(() => undefined);
    isBroken = true;
    render(
      <>
        <p>The other part</p>
        <PartBoundary>
          <Fragile />
        </PartBoundary>
      </>,
    );
    expect(screen.getByRole('alert')).toHaveTextContent('This panel stopped working. The board is fine.');
    expect(screen.getByText(`code ${faultCode(new Error('no such track'))}`)).toBeInTheDocument();
    expect(screen.getByText('The other part')).toBeInTheDocument();
    isBroken = false;
    await userEvent.click(screen.getByRole('button', { name: 'Reload panel' }));
    expect(screen.getByText('Steps')).toBeInTheDocument();
  });

  test('has the same code for the same fault, another for another', () => {
    expect(faultCode(new Error('a'))).toBe(faultCode(new Error('a')));
    expect(faultCode(new Error('a'))).not.toBe(faultCode(new Error('b')));
    expect(faultCode('text')).toMatch(/^[0-9A-F]{4}$/);
  });
});
