import { Checkbox, Radio, RadioGroup } from '@blueprintjs/core';
import {
  ANNOUNCE_SECONDS,
  ANNOUNCEMENTS,
  setPreferences,
  THEMES,
  usePreferences,
  type Announcements,
  type Theme,
} from '../../../lib/preferences';

const THEME_LABELS: Record<Theme, string> = {
  system: 'Auto: as the system is set',
  light: 'Light',
  dark: 'Night: dark, for the cab',
  daylight: 'Daylight: for a phone in the sun, black on white',
};

const ANNOUNCEMENT_LABELS: Record<Announcements, string> = {
  all: 'Everything that changes',
  'act-now': 'Only “Act now”',
};

/** How the pages look and speak in this browser. Takes effect at once; nothing has to be saved. */
export function BrowserPreferences() {
  const { theme, noColour, announce, announceSeconds, letterKeys } = usePreferences();
  return (
    <section className="sp-panel" aria-labelledby="browser-preferences">
      <header>
        <h2 id="browser-preferences">This browser</h2>
        <span className="muted small">kept on this device</span>
      </header>
      <RadioGroup
        label="Look"
        selectedValue={theme}
        onChange={(event) => setPreferences({ theme: event.currentTarget.value as Theme })}
      >
        {THEMES.map((other) => (
          <Radio key={other} value={other} label={THEME_LABELS[other]} />
        ))}
      </RadioGroup>
      <Checkbox
        checked={noColour}
        label="No colour: states by shape and word only. Blue signals stay blue"
        onChange={() => setPreferences({ noColour: !noColour })}
      />
      <RadioGroup
        label="Read out by itself"
        selectedValue={announce}
        onChange={(event) => setPreferences({ announce: event.currentTarget.value as Announcements })}
      >
        {ANNOUNCEMENTS.map((other) => (
          <Radio key={other} value={other} label={ANNOUNCEMENT_LABELS[other]} />
        ))}
      </RadioGroup>
      <RadioGroup
        label="At most once in"
        inline
        disabled={announce === 'act-now'}
        selectedValue={announceSeconds}
        onChange={(event) => setPreferences({ announceSeconds: Number(event.currentTarget.value) })}
      >
        {ANNOUNCE_SECONDS.map((seconds) => (
          <Radio key={seconds} value={seconds} label={`${seconds} s`} />
        ))}
      </RadioGroup>
      <Checkbox
        checked={letterKeys}
        label="Single-letter keys"
        onChange={() => setPreferences({ letterKeys: !letterKeys })}
      />
    </section>
  );
}
