import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { SafetyCaution } from '../../../components/caution';
import { formatClock, formatSince } from '../../../lib/time-display';
import { leftWords } from '../model/tie-up';
import type { ActWays } from './act-ways';
import { Foot } from './foot';
import styles from './phone-parts.module.css';
import { CHECK_WORDS, TieUpDefects, TieUpHead } from './tie-up-parts';
import { useTurnScene } from './turn-context';

/** How a set was left, by whom and when. */
export function TiedUp({ ways, doneBar }: { ways: ActWays; doneBar: ReactNode }) {
  const { turn } = useTurnScene();
  const tiedUp = turn.tiedUp ?? null;
  return (
    <>
      <div className={styles.main}>
        <TieUpHead />
        <section className={styles.next} aria-label="Tied up">
          {tiedUp === null ? (
            <p>On this phone; the words come back with the receipt.</p>
          ) : (
            <Facts tiedUp={tiedUp} />
          )}
        </section>
        <TieUpDefects onDefect={() => ways.onGo({ kind: 'defect' })} />
        <button
          type="button"
          className={`${styles.button} ${styles.wide}`}
          onClick={() => ways.onGo({ kind: 'note' })}
        >
          Note to the desk
        </button>
        <Link className={`${styles.button} ${styles.wide}`} to={`/my/turn/${turn.id}`}>
          To the turn
        </Link>
        <SafetyCaution />
      </div>
      <Foot>{doneBar}</Foot>
    </>
  );
}

type TiedUpFacts = NonNullable<ReturnType<typeof useTurnScene>['turn']['tiedUp']>;

function Facts({ tiedUp }: { tiedUp: TiedUpFacts }) {
  const { turn, now } = useTurnScene();
  const { handbrakes, checks, offAir = false, reason } = tiedUp;
  const rows: [string, string][] = [
    ['Handbrakes', leftWords(handbrakes)],
    ['Seen to', checks.length === 0 ? 'nothing ticked' : checks.map((each) => CHECK_WORDS[each]).join(', ')],
    ['Air', offAir ? `off since ${formatClock(tiedUp.at, turn.zone)}, ${formatSince(tiedUp.at, now)}` : 'on'],
    ...(reason === undefined ? [] : ([['Reason', reason]] as [string, string][])),
  ];
  return (
    <>
      <h2 className={styles.part}>
        Tied up {formatClock(tiedUp.at, turn.zone)}
        {tiedUp.by === null ? '' : `, ${tiedUp.by}`}
      </h2>
      <dl className={styles.lines}>
        {rows.map(([name, words]) => (
          <div key={name} className={styles.line}>
            <dt>{name}</dt>
            <dd className={styles.push}>{words}</dd>
          </div>
        ))}
      </dl>
    </>
  );
}
