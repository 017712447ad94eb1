import { Button, Menu, MenuDivider, MenuItem, Popover } from '@blueprintjs/core';
import { useNavigate } from 'react-router-dom';
import { ROLE_WORDS } from '../components/words';
import { setPreferences, THEMES, usePreferences, type Theme } from '../lib/preferences';
import { usePerson } from '../lib/session';
import { useSignOut } from './sign-out';
import styles from './shell.module.css';

const THEME_WORDS: Record<Theme, string> = {
  system: 'Auto, as the system',
  light: 'Light',
  dark: 'Night',
  daylight: 'Daylight',
};

function MeItems() {
  const navigate = useNavigate();
  const signOut = useSignOut();
  const { theme, noColour } = usePreferences();
  return (
    <Menu>
      <MenuItem text="My sign-in and settings" onClick={() => void navigate('/me')} />
      <MenuDivider title="Look" />
      {THEMES.map((other) => (
        <MenuItem
          key={other}
          text={THEME_WORDS[other]}
          roleStructure="listoption"
          selected={other === theme}
          shouldDismissPopover={false}
          onClick={() => setPreferences({ theme: other })}
        />
      ))}
      <MenuItem
        text="No colour"
        roleStructure="listoption"
        selected={noColour}
        shouldDismissPopover={false}
        onClick={() => setPreferences({ noColour: !noColour })}
      />
      <MenuDivider />
      <MenuItem text="Sign out" onClick={() => signOut.mutate()} />
    </Menu>
  );
}

/** The last place of the top bar: who is signed in, and what is theirs. */
export function MeMenu() {
  const person = usePerson();
  const role = person.roles[0]?.role;
  return (
    <div className={styles.me}>
      <Popover content={<MeItems />} placement="bottom-end" minimal shouldReturnFocusOnClose>
        <Button variant="minimal">
          {person.name}
          {role !== undefined && <span className={styles.role}>, {ROLE_WORDS[role].toLowerCase()}</span>}
          <span className={styles.caret} aria-hidden="true" />
        </Button>
      </Popover>
    </div>
  );
}
