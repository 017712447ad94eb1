import type { ReactNode } from 'react';
import { cannotDoReasons, withdrawReasons } from '../model/reasons';
import { recordLine } from '../model/record-words';
import { AllSteps } from './all-steps';
import { CardPlace } from './card-place';
import { CorrectPlace } from './correct-place';
import { DefectPlace } from './defect-place';
import { NotePlace } from './note-place';
import { NotSoPlace } from './not-so-place';
import styles from './phone-parts.module.css';
import { ReasonPlace } from './reason-place';
import { RecordPlace } from './record-place';
import { ReliefPlace } from './relief-place';
import { useTurnScene } from './turn-context';
import type { Places } from './use-places';

/** Pages behind a button of the act. Only those that end in an act of their own have a bar. */
export function SubPlace({ places }: { places: Places }) {
  const { place, ways, toAct } = places;
  if (place.kind === 'defect') return <DefectPlace ways={ways} onBack={toAct} />;
  if (place.kind === 'relief') return <ReliefPlace ways={ways} onBack={toAct} />;
  return (
    <div className={styles.main}>
      <PlaceOf places={places} />
    </div>
  );
}

function PlaceOf({ places }: { places: Places }): ReactNode {
  const { turn, me } = useTurnScene();
  const { place, toAct, ways } = places;
  const about = `Train ${turn.outbound?.train ?? turn.inbound?.train ?? ''}, track ${turn.track ?? 'not known'}`;
  switch (place.kind) {
    case 'act':
    case 'second':
    case 'defect':
    case 'relief':
    case 'annul':
      return null;
    case 'steps':
      return <AllSteps onPick={places.pick} onGo={ways.onGo} onBack={toAct} />;
    case 'record':
      return <RecordPlace recordKey={place.key} onGo={ways.onGo} />;
    case 'cannot-do':
      return (
        <ReasonPlace
          title={`Can’t do: ${place.label}`}
          about={about}
          reasons={cannotDoReasons(me.role)}
          action="Send to desk"
          onReason={(reason) =>
            ways.onRecord({ kind: 'cannot-do', step: place.step, reason }, `Can’t do: ${place.label}`, null)
          }
          onBack={toAct}
        />
      );
    case 'note':
      return (
        <NotePlace
          about={about}
          onNote={(note) => ways.onRecord({ kind: 'note', note }, 'Note to the desk', null)}
          onBack={toAct}
        />
      );
    case 'withdraw': {
      const words = recordLine(place.record, turn.zone);
      return (
        <ReasonPlace
          title="Withdraw"
          about={`${words}. The first entry stays in the log.`}
          reasons={withdrawReasons}
          action="Withdraw it"
          onReason={(reason) =>
            places.recordQuietly({
              draft: { kind: 'withdrawn', target: place.record.entryId, reason },
              label: `Withdrawn: ${words}`,
            })
          }
          onBack={toAct}
        />
      );
    }
    case 'correct':
      return (
        <CorrectPlace
          record={place.record}
          onAsk={(draft, label) => places.recordQuietly({ draft, label })}
          onBack={toAct}
        />
      );
    case 'not-so':
      return (
        <NotSoPlace
          asked={turn.asksAgreement?.find(({ entryId }) => entryId === place.entryId)}
          onNotSo={places.recordQuietly}
          onBack={toAct}
        />
      );
    case 'card':
      return <CardPlace step={place.step} onBack={toAct} />;
  }
}
