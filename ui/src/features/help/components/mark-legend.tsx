import type { EntrySource, Health, Priority, StepKind, StepState } from '@stubpost/shared';
import { BlueSignalFlag, HealthFlag, PriorityMark } from '../../../components/flags';
import { StepMark } from '../../../components/step-mark';
import styles from './help.module.css';

const SHAPES: readonly { kind: StepKind; words: string }[] = [
  { kind: 'securement', words: 'Securement: a wheel with its chock' },
  { kind: 'brake-test', words: 'Brake test: ring with a dot' },
  { kind: 'ends', words: 'Change of ends: two points facing' },
  { kind: 'air', words: 'Air: gauge with its needle' },
  { kind: 'movement', words: 'Somebody moves to a cab: chevron' },
];

const STATES: readonly { state: StepState; source?: EntrySource; words: string }[] = [
  { state: 'due', words: 'To do: hollow' },
  { state: 'done', words: 'Done, first-hand: filled' },
  { state: 'done', source: 'by-radio', words: 'Done, by radio or entered later: half filled' },
  { state: 'overdue', words: 'Overdue: on an amber tile' },
  { state: 'blocked', words: 'Blocked: behind a bar' },
  { state: 'not-needed', words: 'Not needed on this turn: broken lines' },
  { state: 'withdrawn', words: 'Withdrawn: struck through' },
  { state: 'in-question', words: 'In question, two accounts differ: second outline' },
];

const HEALTHS: readonly { health: Health; words: string }[] = [
  { health: 'tight', words: 'less than a minute to spare' },
  { health: 'short', words: 'the work left no longer fits before the departure' },
  { health: 'late', words: 'the scheduled departure has passed' },
  { health: 'no-word', words: 'nothing heard for longer than the terminal allows' },
];

const PRIORITIES: readonly { priority: Priority; words: string }[] = [
  { priority: 'act-now', words: 'somebody must act this moment' },
  { priority: 'act-soon', words: 'a departure is lost if nobody acts' },
  { priority: 'watch', words: 'look again in a while' },
];

/** Shapes and what they say. Colour comes on top: nothing is told by colour alone. */
export function MarkLegend() {
  return (
    <section className="sp-panel" aria-labelledby="marks">
      <h2 id="marks">The marks</h2>
      <div className={styles.legend}>
        <ul>
          {SHAPES.map(({ kind, words }) => (
            <li key={kind}>
              <StepMark kind={kind} state="due" size={16} /> <span>{words}</span>
            </li>
          ))}
        </ul>
        <ul>
          {STATES.map(({ state, source, words }) => (
            <li key={words}>
              <StepMark kind="brake-test" state={state} source={source ?? null} size={16} />{' '}
              <span>{words}</span>
            </li>
          ))}
        </ul>
        <ul>
          {HEALTHS.map(({ health, words }) => (
            <li key={health}>
              <HealthFlag health={health} /> <span>{words}</span>
            </li>
          ))}
          <li>
            <BlueSignalFlag /> <span>workers on, under or between the cars. Nothing else is blue</span>
          </li>
        </ul>
        <ul>
          {PRIORITIES.map(({ priority, words }) => (
            <li key={priority}>
              <PriorityMark priority={priority} /> <span>{words}</span>
            </li>
          ))}
        </ul>
      </div>
      <p>
        On the board a turn has three lanes: the plan on top, the work from the bumping post to now in the
        middle, and what is to come below. Hatch is work still to do, a thin line is time to spare. The figure
        at the end is the minutes to spare, rounded down; below zero it says how many are missing. The upper
        half of the bar is for acts in a cab, the lower half for acts on the ground.
      </p>
    </section>
  );
}
