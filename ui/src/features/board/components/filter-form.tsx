import { Button, Checkbox, FormGroup, InputGroup } from '@blueprintjs/core';
import { TURN_STATES, type TurnState } from '@stubpost/shared';
import { useId } from 'react';
import { TURN_STATE_WORDS } from '../../../components/words';
import { noFilter, type TurnFilter } from '../model/board-search';
import { isFiltering } from '../model/filter-turns';
import styles from './board-tools.module.css';

export interface FilterFormProps {
  filter: TurnFilter;
  onFilter: (filter: TurnFilter) => void;
}

/** Which turns are shown. Takes effect as it is typed; the address keeps it. */
export function FilterForm({ filter, onFilter }: FilterFormProps) {
  const textId = useId();
  const toggle = (state: TurnState): void => {
    const states = TURN_STATES.filter((one) => (one === state) !== filter.states.includes(one));
    onFilter({ ...filter, states });
  };
  return (
    <form className={styles.filter} aria-label="Filter" onSubmit={(event) => event.preventDefault()}>
      <FormGroup label="Train, set, track, car or person" labelFor={textId}>
        <InputGroup
          id={textId}
          autoFocus
          value={filter.text}
          onValueChange={(text) => onFilter({ ...filter, text })}
        />
      </FormGroup>
      <Checkbox
        checked={filter.needsAction}
        label="Only turns that need action"
        onChange={() => onFilter({ ...filter, needsAction: !filter.needsAction })}
      />
      <fieldset>
        <legend className="small muted">State</legend>
        <div className={styles.states}>
          {TURN_STATES.map((state) => (
            <Checkbox
              key={state}
              checked={filter.states.includes(state)}
              label={TURN_STATE_WORDS[state]}
              onChange={() => toggle(state)}
            />
          ))}
        </div>
      </fieldset>
      <Button disabled={!isFiltering(filter)} onClick={() => onFilter(noFilter)}>
        Clear filter
      </Button>
    </form>
  );
}
