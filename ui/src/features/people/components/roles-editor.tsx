import { Button, HTMLSelect } from '@blueprintjs/core';
import { ALL_TERMINALS, isRole, ROLES, type RoleGrant, type WireTerminal } from '@stubpost/shared';
import { ROLE_WORDS } from '../../../components/words';
import styles from './people.module.css';

interface RowProps {
  grant: RoleGrant;
  number: number;
  terminals: readonly WireTerminal[];
  onChange: (grant: RoleGrant) => void;
  onRemove: () => void;
}

function GrantRow({ grant, number, terminals, onChange, onRemove }: RowProps) {
  return (
    <li className={styles.grant}>
      <HTMLSelect
        aria-label={`Role ${number}`}
        value={grant.role}
        onChange={({ currentTarget: { value } }) => isRole(value) && onChange({ ...grant, role: value })}
      >
        {ROLES.map((role) => (
          <option key={role} value={role}>
            {ROLE_WORDS[role]}
          </option>
        ))}
      </HTMLSelect>
      <HTMLSelect
        aria-label={`Terminal of role ${number}`}
        value={grant.terminal}
        onChange={(event) => onChange({ ...grant, terminal: event.currentTarget.value })}
      >
        <option value={ALL_TERMINALS}>All terminals</option>
        {terminals.map(({ code, name }) => (
          <option key={code} value={code}>
            {name}
          </option>
        ))}
      </HTMLSelect>
      <Button variant="minimal" onClick={onRemove} aria-label={`Remove role ${number}`}>
        Remove
      </Button>
    </li>
  );
}

export interface RolesEditorProps {
  grants: readonly RoleGrant[];
  terminals: readonly WireTerminal[];
  onChange: (grants: RoleGrant[]) => void;
}

/** Roles by terminal, a line each. */
export function RolesEditor({ grants, terminals, onChange }: RolesEditorProps) {
  return (
    <fieldset className={styles.roles}>
      <legend>Roles, each at one terminal or at all</legend>
      <ul>
        {grants.map((grant, index) => (
          <GrantRow
            key={index}
            grant={grant}
            number={index + 1}
            terminals={terminals}
            onChange={(changed) => onChange(grants.with(index, changed))}
            onRemove={() => onChange(grants.toSpliced(index, 1))}
          />
        ))}
      </ul>
      <Button
        onClick={() =>
          onChange([...grants, { role: 'conductor', terminal: terminals[0]?.code ?? ALL_TERMINALS }])
        }
      >
        Add a role
      </Button>
    </fieldset>
  );
}
