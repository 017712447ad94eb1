import { memo } from 'react';
import type { HeadLine, RowHead } from '../model/head-lines';
import type { RowSubject } from '../model/group-rows';
import type { TurnAct } from '../model/list-keys';
import styles from './row-heads.module.css';
import type { TurnList } from './use-turn-list';

export interface RowHeadsProps {
  caption: string;
  subject: RowSubject;
  heads: readonly RowHead[];
  wordsOf: ReadonlyMap<string, string>;
  /** The focused step of the focused turn in words; it takes the third line of the row while it has the focus. */
  stepWords: string | null;
  list: TurnList;
  openId: string | null;
  onAct: (act: TurnAct, turnId: string, step: string | null) => void;
}

/** Heads of the picture's rows: a table of its own that says in words what the picture draws. */
export function RowHeads(props: RowHeadsProps) {
  const { subject, list } = props;
  return (
    <div className={styles.heads}>
      <table
        role="grid"
        ref={list.container}
        onKeyDown={list.onKeyDown}
        onFocus={list.onFocus}
        onBlur={list.onBlur}
      >
        <caption className="unseen">{props.caption}</caption>
        <colgroup>
          {[44, 58, 38, 96, 46, 54].map((width, index) => (
            <col key={index} style={{ width }} />
          ))}
        </colgroup>
        <thead>
          <tr>
            <th scope="col" className={styles.subject}>
              {subject === 'track' ? 'Track' : 'Set'}
            </th>
            <th scope="col" className={styles.train}>
              Train
            </th>
            <th scope="col">{subject === 'track' ? 'Set' : 'Trk'}</th>
            <th scope="col">State</th>
            <th scope="col" className={styles.number}>
              Leaves
            </th>
            <th scope="col" className={styles.spareHead}>
              Spare
            </th>
          </tr>
        </thead>
        {props.heads.map((head) => (
          <RowHeadBody
            key={head.rowId}
            head={head}
            wordsOf={props.wordsOf}
            activeId={head.lines.some((line) => line.id === list.activeId) ? list.activeId : null}
            activeStep={head.lines.some((line) => line.id === list.activeId) ? list.activeStep : null}
            stepWords={head.lines.some((line) => line.id === list.activeId) ? props.stepWords : null}
            openId={head.lines.some((line) => line.id === props.openId) ? props.openId : null}
            onAct={props.onAct}
          />
        ))}
      </table>
    </div>
  );
}

interface BodyProps {
  head: RowHead;
  wordsOf: ReadonlyMap<string, string>;
  activeId: string | null;
  activeStep: string | null;
  stepWords: string | null;
  openId: string | null;
  onAct: RowHeadsProps['onAct'];
}

const RowHeadBody = memo(function RowHeadBody(props: BodyProps) {
  const { head, activeId, activeStep, stepWords } = props;
  const isOnStep = activeStep !== null && activeId !== null;
  const lines = isOnStep && head.about === null ? linesBesideStep(head.lines, activeId) : head.lines;
  const subject = (
    <td className={subjectClass(head.label)} rowSpan={3} aria-label={head.labelWords}>
      {head.label}
    </td>
  );
  return (
    <tbody>
      {lines.map((line, index) => (
        <HeadRow key={line.id} line={line} subject={index === 0 ? subject : null} {...props} />
      ))}
      {lines.length === 0 && (
        <tr>
          {subject}
          <td colSpan={5} className={styles.empty} />
        </tr>
      )}
      {lines.length < 2 && (
        <tr>
          <td colSpan={5} className={styles.empty} />
        </tr>
      )}
      {isOnStep ? (
        <tr className={styles.about}>
          <td
            colSpan={5}
            className={styles.stepLine}
            data-turn={activeId}
            data-step={activeStep}
            tabIndex={0}
          >
            {stepWords}
          </td>
        </tr>
      ) : (
        head.about !== null && (
          <tr className={styles.about}>
            <td colSpan={5}>
              {head.about.flag === null ? (
                head.about.text
              ) : (
                <span className={`flag ${head.about.flag}`}>{head.about.text}</span>
              )}
            </td>
          </tr>
        )
      )}
    </tbody>
  );
});

/** Two figures stand large; longer labels must fit into the same cell. */
function subjectClass(label: string): string {
  if (label.length <= 2) return styles.subject ?? '';
  return `${styles.subject} ${label.length <= 4 ? styles.long : styles.words}`;
}

/** With three turns in the head the focused step takes the place of another one. */
function linesBesideStep(lines: readonly HeadLine[], activeId: string): HeadLine[] {
  const spare = [...lines].reverse().find((line) => line.id !== activeId);
  return lines.filter((line) => line !== spare);
}

function HeadRow({
  line,
  subject,
  wordsOf,
  activeId,
  activeStep,
  openId,
  onAct,
}: BodyProps & { line: HeadLine; subject: JSX.Element | null }) {
  const looks = [styles[line.look], line.untaken && styles.untaken, openId === line.id && styles.picked];
  return (
    <tr
      className={looks.filter(Boolean).join(' ')}
      data-turn={line.id}
      tabIndex={activeId === line.id && activeStep === null ? 0 : -1}
      aria-label={wordsOf.get(line.id)}
      aria-selected={openId === line.id}
      onClick={() => onAct('open', line.id, null)}
    >
      {subject}
      <th scope="row" className={styles.train}>
        {line.train}
      </th>
      <td>{line.other}</td>
      <td>{line.flag === null ? line.state : <span className={`flag ${line.flag}`}>{line.state}</span>}</td>
      <td className={`${styles.number} ${styles.leaves}`}>{line.leaves}</td>
      <td className={styles.spare}>{line.spare}</td>
    </tr>
  );
}
