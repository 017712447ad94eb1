import type { PlanStep } from '@stubpost/shared';
import { StepMark } from '../../../components/step-mark';
import { formatAnchored, formatMinutes } from '../model/minutes-text';
import type { LatestFinish } from '../model/plan-figures';
import { DOER_WORDS } from './plan-words';
import styles from './setup.module.css';

/** One line of the table: a step with its row's id, and whether something in it is to be mended. */
export interface StepRow {
  id: string;
  step: PlanStep;
  isWrong: boolean;
}

export interface StepsTableProps {
  rows: readonly StepRow[];
  latestFinishes: readonly LatestFinish[] | null;
  chosenId: string | null;
  onChoose: (id: string) => void;
}

/** The steps of a plan in their order, with what each comes to. */
export function StepsTable({ rows, latestFinishes, chosenId, onChoose }: StepsTableProps) {
  return (
    <div className="sp-table-scroll" tabIndex={0} role="region" aria-label="Steps of the plan">
      <table className="sp-table">
        <thead>
          <tr>
            <th scope="col">Step</th>
            <th scope="col">By</th>
            <th scope="col">Due</th>
            <th scope="col" className="number">
              Short – typical – long
            </th>
            <th scope="col">After</th>
            <th scope="col">Latest finish</th>
            <th scope="col">Holds</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Row
              key={row.id}
              row={row}
              names={new Map(rows.map(({ step }) => [step.key, step.shortLabel]))}
              latest={latestFinishes?.find(({ key }) => key === row.step.key)}
              isChosen={row.id === chosenId}
              onChoose={onChoose}
            />
          ))}
        </tbody>
      </table>
    </div>
  );
}

interface RowProps {
  row: StepRow;
  names: ReadonlyMap<string, string>;
  latest: LatestFinish | undefined;
  isChosen: boolean;
  onChoose: (id: string) => void;
}

function Row({ row, names, latest, isChosen, onChoose }: RowProps) {
  const { step } = row;
  const durations = [step.shortSeconds, step.typicalSeconds, step.longSeconds].map(formatMinutes).join(' – ');
  return (
    <tr className={isChosen ? styles.chosen : undefined}>
      <th scope="row">
        <StepMark kind={step.kind} state="not-due" />{' '}
        <button
          type="button"
          className={styles.pick}
          aria-pressed={isChosen}
          onClick={() => onChoose(row.id)}
        >
          {step.shortLabel === '' ? 'New step' : step.shortLabel}
        </button>
        {row.isWrong && <span className={`${styles.wrong} ${styles.mend}`}>to mend</span>}
      </th>
      <td>{DOER_WORDS[step.doer]}</td>
      <td className={styles.nowrap}>{formatAnchored(step.anchor, step.offsetSeconds)}</td>
      <td className={`number ${styles.nowrap}`}>{durations}</td>
      <td>{step.after.map((key) => names.get(key) ?? key).join(', ')}</td>
      <td className={styles.nowrap}>
        {latest === undefined ? '–' : finishWords(latest.secondsFromDeparture)}
      </td>
      <td>{step.holdsDeparture ? 'yes' : 'no'}</td>
    </tr>
  );
}

const finishWords = (seconds: number): string =>
  seconds === 0 ? 'departure' : formatAnchored('departure', seconds);
