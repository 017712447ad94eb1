import { InputGroup } from '@blueprintjs/core';
import type { WireDutyRoster } from '@stubpost/shared';
import styles from './duty.module.css';

type People = WireDutyRoster['people'];

interface QuietEditorProps {
  people: People;
  isReadOnly: boolean;
  onChange: (people: People) => void;
}

/** Hours in which somebody who is not on the desk is left alone. */
export function QuietEditor({ people, isReadOnly, onChange }: QuietEditorProps) {
  const put = (id: string, part: 'from' | 'until', text: string): void =>
    onChange(
      people.map((person) => {
        if (person.id !== id) return person;
        const quiet = { from: '', until: '', ...person.quiet, [part]: text };
        return { ...person, quiet: quiet.from === '' && quiet.until === '' ? null : quiet };
      }),
    );
  return (
    <table className={`sp-table ${styles.quiet}`}>
      <thead>
        <tr>
          <th scope="col">Who</th>
          <th scope="col">Quiet from</th>
          <th scope="col">until</th>
        </tr>
      </thead>
      <tbody>
        {people.map((person) => (
          <tr key={person.id}>
            <th scope="row">
              {person.name}
              {person.isSupervisor && <span className="muted small"> supervisor</span>}
            </th>
            {(['from', 'until'] as const).map((part) => (
              <td key={part}>
                <InputGroup
                  className={styles.from ?? ''}
                  inputMode="numeric"
                  placeholder="–"
                  aria-label={`${person.name}, quiet ${part}`}
                  readOnly={isReadOnly}
                  value={person.quiet?.[part] ?? ''}
                  onValueChange={(text) => put(person.id, part, text)}
                />
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
