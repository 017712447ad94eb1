import styles from './help.module.css';

const LIFE =
  'Scheduled, Inbound, Arrived, Secured, Ends changed, Crew in cab, Ready, Departed, Tested, Closed; or Annulled.';

const WORDS: readonly { word: string; means: string }[] = [
  { word: 'Turn', means: 'one train at one terminal from its arrival to its next departure' },
  { word: 'Life of a turn', means: LIFE },
  {
    word: 'To spare, short',
    means:
      'how long the work may still wait without costing the scheduled departure; short is how much is missing',
  },
  {
    word: 'By hand, by radio, by feed, entered later',
    means:
      'how a fact is known: from the one who did it, over the radio by the desk, from another system, afterwards',
  },
  {
    word: 'Withdrawn, corrected',
    means:
      'nothing is deleted: taking back and correcting are entries of their own, and the first one stays. Once the train has left they wait until somebody else approves them',
  },
  {
    word: 'Sealed, chain, head',
    means:
      'each entry has a hash over all of its fields and over the entry before; the last hash of a day, kept elsewhere, shows later whether anything was changed',
  },
  {
    word: 'In question, ruling',
    means:
      'two times for one step, or somebody does not agree; which one counts is said by the dispatcher or the supervisor',
  },
  {
    word: 'Taken, set aside, cleared, closed',
    means:
      'somebody has the alert; it waits until a time with a reason; its cause is gone; its cause is named',
  },
  {
    word: 'Burst, repeater, standing, untaken',
    means:
      'more than 10 alerts in 10 minutes, until fewer than 5; an alert that comes back soon after it cleared; not cleared yet; taken by nobody',
  },
  {
    word: 'Precision',
    means:
      'the share of alerts that were right. Of late departures at least those that left late all the same, at most also those about which somebody did something',
  },
  { word: 'First train out, tie-up', means: 'a turn without an arrival; a turn without a departure' },
  { word: 'Extra', means: 'a turn that is in no timetable, entered by hand' },
];

/** Words that have one meaning here. */
export function WordList() {
  return (
    <section className="sp-panel" aria-labelledby="words">
      <h2 id="words">Words</h2>
      <dl className={styles.words}>
        {WORDS.map(({ word, means }) => (
          <div key={word}>
            <dt>{word}</dt>
            <dd>{means}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}
