import { Switch } from '@blueprintjs/core';
import { setPreferences, usePreferences } from '../../../lib/preferences';
import { KEY_GROUPS, type KeyGroup, type KeyLine } from '../model/key-sheet';
import styles from './help.module.css';

function Line({ line, isOff }: { line: KeyLine; isOff: boolean }) {
  return (
    <tr>
      <th scope="row" className={styles.keys}>
        {line.keys.map((key) => (
          <kbd key={key} className={isOff ? styles.off : undefined}>
            {key}
          </kbd>
        ))}
        {isOff && <span className="muted small">switched off</span>}
      </th>
      <td>{line.does}</td>
      <td data-head="By pointing" className="muted">
        {line.button}
      </td>
    </tr>
  );
}

function Group({ group, lettersOff }: { group: KeyGroup; lettersOff: boolean }) {
  return (
    <section className="sp-panel">
      <h2>{group.where}</h2>
      <table className="sp-table sp-stack">
        <thead>
          <tr>
            <th scope="col">Key</th>
            <th scope="col">Does</th>
            <th scope="col">The same by pointing</th>
          </tr>
        </thead>
        <tbody>
          {group.lines.map((line) => (
            <Line key={line.keys.join(' ')} line={line} isOff={lettersOff && line.isLetter === true} />
          ))}
        </tbody>
      </table>
    </section>
  );
}

/** Every key, where it works, and the switch that turns the single letters off. */
export function KeySheet() {
  const { letterKeys } = usePreferences();
  return (
    <>
      <Switch
        checked={letterKeys}
        label="Single-letter keys work in this browser"
        onChange={() => setPreferences({ letterKeys: !letterKeys })}
      />
      {KEY_GROUPS.map((group) => (
        <Group key={group.where} group={group} lettersOff={!letterKeys} />
      ))}
    </>
  );
}
