import { Button } from '@blueprintjs/core';
import { createTerminalSchema } from '@stubpost/shared';
import { useState, type FormEvent } from 'react';
import { FieldSummary, type FieldProblem } from '../../../components/field-summary';
import { errorText } from '../../../lib/error-texts';
import { useAddTerminal } from '../api/terminals';
import { TextField } from './setup-field';

interface Draft {
  code: string;
  name: string;
  zone: string;
}

const words: Record<keyof Draft, string> = {
  code: 'Code: 1 to 12 letters, digits or dashes.',
  name: 'Name is missing.',
  zone: 'Time zone is missing.',
};

const fields: readonly (keyof Draft)[] = ['code', 'name', 'zone'];

function problemsOf(draft: Draft): FieldProblem[] {
  const parsed = createTerminalSchema.safeParse(draft);
  const wrong = new Set(parsed.success ? [] : parsed.error.issues.map(({ path }) => String(path[0])));
  return fields
    .filter((field) => wrong.has(field))
    .map((field) => ({ fieldId: `terminal-${field}`, words: words[field] }));
}

/** Adds a terminal by hand; importing a timetable does it too. */
export function AddTerminal() {
  const [draft, setDraft] = useState<Draft>({ code: '', name: '', zone: '' });
  const [problems, setProblems] = useState<FieldProblem[]>([]);
  const add = useAddTerminal();
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const found = problemsOf(draft);
    setProblems(found);
    if (found.length === 0)
      add.mutate(draft, { onSuccess: () => setDraft({ code: '', name: '', zone: '' }) });
  };
  const at = (field: keyof Draft) => ({
    id: `terminal-${field}`,
    value: draft[field],
    onChange: (text: string) => setDraft({ ...draft, [field]: text }),
    problem: problems.find(({ fieldId }) => fieldId === `terminal-${field}`)?.words,
  });
  return (
    <form className="sp-panel" onSubmit={submit} noValidate aria-labelledby="add-terminal">
      <header>
        <h2 id="add-terminal">Add a terminal</h2>
      </header>
      <FieldSummary problems={problems} />
      {add.isError && (
        <p className="sp-problems" role="alert">
          {errorText(add.error)}
        </p>
      )}
      {add.isSuccess && <p role="status">{add.data.name} is added.</p>}
      <TextField
        {...at('code')}
        label="Code"
        hint="As in the address of its board, such as HBR"
        maxLength={12}
      />
      <TextField {...at('name')} label="Name" maxLength={80} />
      <TextField {...at('zone')} label="Time zone" hint="IANA name, such as America/New_York" />
      <div className="sp-actions">
        <Button type="submit" intent="primary" loading={add.isPending}>
          Add
        </Button>
      </div>
    </form>
  );
}
