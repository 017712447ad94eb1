import { defaultStepPlanSteps, type PlanStep } from '@stubpost/shared';

/**
 * What the invented railroad tells its crews about some steps. Examples, and they say so: a real railroad writes its
 * own, and its rule book decides.
 */
const instructions: Readonly<Record<string, string>> = {
  'handbrake-set': `Example of the Ostrel Valley Railroad.
1. Stop at the marker for the length of the train.
2. Set the handbrakes the yard sheet asks for, from the post outwards.
3. Say their number and cars by radio: "Handbrakes two, cars 5512 and 5513."`,
  'cab-brake-check': `Example of the Ostrel Valley Railroad.
Short application and release from the arriving cab. The conductor watches the rear car and answers by intercom.`,
  'ends-changed': `Example of the Ostrel Valley Railroad.
Cut the brake valve out, take the reverser along, lock the cab. Tell the conductor before you walk.`,
  'handbrake-released': `Example of the Ostrel Valley Railroad.
Only with the engineer in the leaving cab and an application holding the train.
Release as many as were set, and count them aloud.`,
  'leaving-end-test': `Example of the Ostrel Valley Railroad.
Apply and release from the leaving end. Somebody sees the rear brakes answer and says so.`,
  'running-test': `Example of the Ostrel Valley Railroad.
As soon as the speed permits after leaving. Never recorded from the cab.`,
};

/** The steps of the shipped plan with the invented railroad's cards on them. */
export const demoPlanSteps: PlanStep[] = defaultStepPlanSteps.map((step) => {
  const instruction = instructions[step.key];
  return instruction === undefined ? step : { ...step, instruction };
});
