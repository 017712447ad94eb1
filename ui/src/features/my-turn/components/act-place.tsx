import type { ReactNode } from 'react';
import { asksFrom } from '../model/asks-from';
import { controlsBar } from '../model/controls';
import { hasLeft, type NextAct } from '../model/next-act';
import { ActBar } from './act-bar';
import { ActBody } from './act-body';
import { ActLines } from './act-lines';
import type { ActWays } from './act-ways';
import { AtTheControls } from './at-the-controls';
import { Foot } from './foot';
import styles from './phone-parts.module.css';
import { SpareWords } from './spare-words';
import { TrainFacts } from './train-facts';
import { TurnPicture } from './turn-picture';
import { useTurnScene } from './turn-context';
import { useAct } from './use-act';

export interface ActPlaceProps extends ActWays {
  act: NextAct;
  /** The person chose this step out of the plan's order. */
  isPicked: boolean;
  /** While the last act can be undone its bar stands in the foot, and this act is what comes after. */
  doneBar: ReactNode;
  /** Brings this act under the bar although the last one can still be undone. */
  onGoOn: () => void;
}

/** One act on the page of a turn: what it is, what it asks for, and the bar. */
export function ActPlace(props: ActPlaceProps) {
  const { act, doneBar, isPicked } = props;
  const { turn, now, steps, me, marker, nextArrivalAt } = useTurnScene();
  const page = useAct(act);
  const bar = controlsBar({ turn, steps, personId: me.id, act, now, nextArrivalAt });
  const isAfter = doneBar !== null;
  // What others wait for stands first; the picture makes room for it.
  const isAsked = asksFrom(turn, me.id).length > 0;
  const isShut = page.lock !== null && !page.isLockLifted;
  const hasInputs = page.fields.length > 0 && !isAfter && !isShut;
  return (
    <>
      <div className={styles.main}>
        <TrainFacts turn={turn} now={now} marker={marker} />
        {bar === null || bar.kind === 'own-act' ? (
          <Standing isCompact={hasInputs || page.asksTime || isAsked} />
        ) : null}
        {bar !== null && !isAfter ? (
          <>
            <AtTheControls bar={bar} />
            {bar.kind === 'own-act' && <ActLines act={act} ways={props} />}
          </>
        ) : (
          <ActBody
            page={page}
            lead={leadOf(isAfter, isPicked)}
            isAfter={isAfter}
            ways={props}
            onGoOn={props.onGoOn}
          />
        )}
      </div>
      <Foot>{doneBar ?? <ActBar page={page} bar={bar} isPicked={isPicked} ways={props} />}</Foot>
    </>
  );
}

const leadOf = (isAfter: boolean, isPicked: boolean): string =>
  isAfter ? 'After this' : isPicked ? 'Chosen step' : 'Next step';

/** The picture of the turn; where the page needs the room, only how it stands, and only when somebody must act. */
function Standing({ isCompact }: { isCompact: boolean }) {
  const { turn, now } = useTurnScene();
  if (!isCompact) return <TurnPicture turn={turn} now={now} />;
  if (turn.health === 'on-plan' || hasLeft(turn)) return null;
  return (
    <p>
      <SpareWords turn={turn} />
    </p>
  );
}
