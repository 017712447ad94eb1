import { Checkbox, FormGroup, InputGroup } from '@blueprintjs/core';
import { MESSAGE_CHANNELS, type WireDutyRoster } from '@stubpost/shared';
import { PriorityMark } from '../../../components/flags';
import { CHANNEL_WORDS, RUNG_WORDS } from './duty-words';
import styles from './duty.module.css';

type Step = WireDutyRoster['steps'][number];

interface StepEditorProps {
  steps: readonly Step[];
  isReadOnly: boolean;
  onChange: (steps: Step[]) => void;
}

/** After how many seconds untaken which people are told, and by which ways. */
export function StepEditor({ steps, isReadOnly, onChange }: StepEditorProps) {
  const put = (index: number, change: Partial<Step>): void =>
    onChange(steps.map((step, other) => (other === index ? { ...step, ...change } : step)));
  const toggle = (index: number, { channels }: Step, channel: Step['channels'][number]): void => {
    const next = channels.includes(channel)
      ? channels.filter((each) => each !== channel)
      : [...channels, channel];
    if (next.length > 0) put(index, { channels: next });
  };
  return (
    <ul className={styles.steps}>
      {steps.map((step, index) => (
        <li key={`${step.priority} ${step.rung}`}>
          <PriorityMark priority={step.priority} />
          <FormGroup label={`Seconds until told: ${RUNG_WORDS[step.rung]}`} labelFor={`step-${index}`}>
            <InputGroup
              id={`step-${index}`}
              inputMode="numeric"
              className={styles.days ?? ''}
              readOnly={isReadOnly}
              value={String(step.afterSeconds)}
              onValueChange={(text) =>
                put(index, { afterSeconds: Number(text.replace(/\D/g, '').slice(0, 4)) })
              }
            />
          </FormGroup>
          {MESSAGE_CHANNELS.map((channel) => (
            <Checkbox
              key={channel}
              label={CHANNEL_WORDS[channel]}
              disabled={isReadOnly}
              checked={step.channels.includes(channel)}
              onChange={() => toggle(index, step, channel)}
            />
          ))}
        </li>
      ))}
    </ul>
  );
}
