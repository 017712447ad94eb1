import { defaultStepPlanSteps, forecastInputOf, forecastTurn, stepsFor, turnFrom } from '@stubpost/shared';
import { anEntry, aTurn } from '@stubpost/shared/testing';
import { render, screen } from '@testing-library/react';
import { expect, test } from 'vitest';
import { clockAt } from '../../../testing/wire-turn';
import { formatTime } from '../../../lib/time-display';
import { TurnFigure } from './turn-figure';

test('the example on the sign-in page says what the forecast says of such a turn', () => {
  const planned = aTurn({ scheduledArrivalAt: clockAt('17:18'), scheduledDepartureAt: clockAt('17:40') });
  const recorded = [
    ['handbrake-set', '17:19:52'],
    ['cab-brake-check', '17:23:08'],
    ['ends-changed', '17:27:31'],
  ] as const;
  const entries = [
    anEntry('arrival', { id: '00000000-0000-4000-8000-000000000001', observedAt: clockAt('17:18:20') }),
    ...recorded.map(([step, clock], at) =>
      anEntry('step-done', {
        id: `00000000-0000-4000-8000-00000000001${at}`,
        step,
        observedAt: clockAt(clock),
      }),
    ),
  ];
  const facts = turnFrom(planned, stepsFor(defaultStepPlanSteps, planned), entries);
  const forecast = forecastTurn(forecastInputOf(facts), clockAt('17:29:06'));
  const readyAt = formatTime(forecast.readyAt ?? 0, 'America/New_York');
  const toSpare = `${Math.floor((forecast.slackSeconds ?? 0) / 60)} min`;

  render(<TurnFigure />);
  expect(screen.getByText(`ready by ${readyAt}`)).toBeInTheDocument();
  expect(screen.getByText(`${toSpare} to spare`)).toBeInTheDocument();
});
