import { defaultStepPlanSteps, type PlanStep } from '@stubpost/shared';
import { StepMark } from '../../../components/step-mark';
import { formatDuration } from '../../../lib/time-display';

const PLACE_WORDS: Record<PlanStep['place'], string> = { cab: 'in a cab', ground: 'on the ground' };

function due({ anchor, offsetSeconds }: PlanStep): string {
  const side = offsetSeconds < 0 ? 'before' : 'after';
  return `${formatDuration(offsetSeconds)} ${side} ${anchor}`;
}

/** The steps of the shipped plan, as a railroad without a plan of its own starts with. */
export function TurnStory() {
  return (
    <section className="sp-panel" aria-labelledby="how-a-turn-works">
      <h2 id="how-a-turn-works">How a turn works</h2>
      <p>
        The steps below are the shipped plan for a push-pull train. A supervisor can write another for each
        terminal, with the day from which it is in force. A step is due so long after the arrival or so long
        before the departure: when a train comes in late the first ones move and the last ones stay, and the
        room between them is what is left to spare.
      </p>
      <div className="sp-table-scroll" role="region" aria-label="Steps of a turn" tabIndex={0}>
        <table className="sp-table sp-stack">
          <thead>
            <tr>
              <th scope="col">Step</th>
              <th scope="col">Who, where</th>
              <th scope="col">Due</th>
              <th scope="col">Usually takes</th>
              <th scope="col">Holds the departure</th>
            </tr>
          </thead>
          <tbody>
            {defaultStepPlanSteps.map((step) => (
              <tr key={step.key}>
                <th scope="row">
                  <StepMark kind={step.kind} state="not-due" /> {step.label}
                </th>
                <td data-head="Who, where">
                  {step.doer}, {PLACE_WORDS[step.place]}
                </td>
                <td data-head="Due">{due(step)}</td>
                <td data-head="Usually takes">
                  {step.typicalSeconds === 0 ? '–' : formatDuration(step.typicalSeconds)}
                </td>
                <td data-head="Holds the departure">{step.holdsDeparture ? 'yes' : 'no'}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </section>
  );
}
