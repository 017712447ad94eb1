import { Button, FileInput, FormGroup, InputGroup } from '@blueprintjs/core';
import { formatRouteTypes, parseRouteTypes, railRouteTypes } from '@stubpost/shared';
import { useState, type FormEvent } from 'react';
import { FieldSummary, type FieldProblem } from '../../../components/field-summary';
import { errorText } from '../../../lib/error-texts';
import { useBringIn } from '../api/timetable-acts';
import { formatBytes } from '../model/timetable-words';
import styles from './timetables.module.css';

function problemsOf(file: File | null, routeTypes: string): FieldProblem[] {
  return [
    ...(file === null ? [{ fieldId: 'timetable-file', words: 'No file is chosen.' }] : []),
    ...(routeTypes.trim() !== '' && parseRouteTypes(routeTypes) === null
      ? [{ fieldId: 'route-types', words: 'Route types are numbers or ranges, such as 2,100-117.' }]
      : []),
  ];
}

/** Chooses a zip and sends it. Nothing that runs is changed by that. */
export function BringInPanel({
  onSent,
  onClose,
}: {
  /** Told the id of the timetable that is now being read. */
  onSent: (id: string) => void;
  /** Offered when there is something to go back to. */
  onClose?: (() => void) | undefined;
}) {
  const [file, setFile] = useState<File | null>(null);
  const [routeTypes, setRouteTypes] = useState('');
  const [problems, setProblems] = useState<FieldProblem[]>([]);
  const bringIn = useBringIn();
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const found = problemsOf(file, routeTypes);
    setProblems(found);
    if (file === null || found.length > 0) return;
    bringIn.mutate({ file, routeTypes }, { onSuccess: ({ id }) => onSent(id) });
  };
  return (
    <form className="sp-panel" onSubmit={submit} noValidate aria-labelledby="bring-in">
      <header>
        <h2 id="bring-in">Bring in a timetable</h2>
      </header>
      <p id="bring-in-hint" className={styles.hint}>
        A zip in GTFS Schedule format, up to 128 MB, as the railroad publishes it. It is read in the
        background. The running timetable stays as it is until another one is made active.
      </p>
      <FieldSummary problems={problems} />
      {bringIn.isError && (
        <p className="sp-problems" role="alert">
          {errorText(bringIn.error)}
        </p>
      )}
      <div className={`sp-fields ${styles.bringIn}`}>
        <FormGroup label="Timetable, GTFS zip" labelFor="timetable-file">
          <FileInput
            fill
            text={file === null ? 'Choose a zip' : `${file.name}, ${formatBytes(file.size)}`}
            disabled={bringIn.isPending}
            hasSelection={file !== null}
            inputProps={{
              id: 'timetable-file',
              accept: '.zip,application/zip',
              'aria-describedby': 'bring-in-hint',
            }}
            onInputChange={(event) => setFile(event.currentTarget.files?.[0] ?? null)}
          />
        </FormGroup>
        <FormGroup
          label="Route types"
          labelFor="route-types"
          helperText={`${formatRouteTypes(railRouteTypes)} (rail) when left empty`}
        >
          <InputGroup
            id="route-types"
            className={styles.routeTypes}
            value={routeTypes}
            disabled={bringIn.isPending}
            onValueChange={setRouteTypes}
          />
        </FormGroup>
      </div>
      <div className="sp-actions">
        <Button type="submit" intent="primary" disabled={bringIn.isPending}>
          {bringIn.isPending ? 'Sending' : 'Bring in'}
        </Button>
        {onClose !== undefined && (
          <Button onClick={onClose} disabled={bringIn.isPending}>
            Close
          </Button>
        )}
      </div>
    </form>
  );
}
