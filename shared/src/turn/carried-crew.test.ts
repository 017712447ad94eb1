import { describe, expect, it } from 'vitest';
import { addSeconds } from '../lib/instant';
import { defaultStepPlanSteps } from '../plan/default-step-plan';
import { aTurn, anEntry, fixedArrival } from '../testing/builders';
import { crewToCarry } from './carried-crew';
import { turnFrom } from './evolve';

const conductor = { personId: 'c-1', name: 'M. Tolland' };
const engineer = { personId: 'e-1', name: 'P. Varga' };
const crew = [
  anEntry('crew', { person: conductor, as: 'conductor' }),
  anEntry('crew', { person: engineer, as: 'engineer' }),
];

describe('the crew that goes on with the set', () => {
  it('is the crew of the turn, said for the turn before', () => {
    const facts = turnFrom(aTurn(), defaultStepPlanSteps, crew);
    expect(crewToCarry(facts)).toEqual([
      { as: 'conductor', ...conductor, since: null, carriedOver: true },
      { as: 'engineer', ...engineer, since: null, carriedOver: true },
    ]);
  });

  it('leaves out who was relieved', () => {
    const relief = anEntry('relief', {
      as: 'engineer',
      out: engineer,
      in: null,
      observedAt: addSeconds(fixedArrival, 60),
    });
    expect(
      crewToCarry(turnFrom(aTurn(), defaultStepPlanSteps, [...crew, relief])).map(({ as }) => as),
    ).toEqual(['conductor']);
  });

  it('is nobody after a tie-up and after an annulled turn', () => {
    expect(crewToCarry(turnFrom(aTurn({ kind: 'tie-up' }), defaultStepPlanSteps, crew))).toEqual([]);
    expect(crewToCarry(turnFrom(aTurn(), defaultStepPlanSteps, [...crew, anEntry('annulled')]))).toEqual([]);
  });
});
