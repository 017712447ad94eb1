import { Button, FormGroup, InputGroup } from '@blueprintjs/core';
import { judgePin, pinLongest, pinPattern, pinShortest, type OwnBadge } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { PasswordField } from '../../../components/password-field';
import { errorText } from '../../../lib/error-texts';
import { ownBadgeQuery, useChangePin } from '../api/own-sign-in';

const digitsOnly = (text: string): string => text.replace(/\D/g, '').slice(0, pinLongest);

function pinProblem(pin: string): string | null {
  if (!pinPattern.test(pin)) return `A PIN has ${pinShortest} to ${pinLongest} digits.`;
  return judgePin(pin) === 'good' ? null : 'One digit repeated, or a run such as 1234, is tried first.';
}

/** One's own PIN, which opens shared phones together with the badge. The administrator gives the badge out. */
export function OwnPin() {
  const { data } = useQuery(ownBadgeQuery);
  if (data === undefined) return null;
  if (data.badge !== null) return <PinForm badge={data} />;
  return (
    <section className="sp-panel" aria-labelledby="own-pin">
      <header>
        <h2 id="own-pin">Badge and PIN</h2>
      </header>
      <p>
        No badge yet. With one, a PIN opens phones that a crew shares. The administrator gives badges out.
      </p>
    </section>
  );
}

function PinForm({ badge }: { badge: OwnBadge }) {
  const [current, setCurrent] = useState('');
  const [pin, setPin] = useState('');
  const [problem, setProblem] = useState<string | null>(null);
  const change = useChangePin();
  const send = (next: string | null): void =>
    change.mutate(badge.hasPassword ? { current, pin: next } : { pin: next }, {
      onSuccess: () => {
        setCurrent('');
        setPin('');
      },
    });
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const found = pinProblem(pin);
    setProblem(found);
    if (found === null) send(pin);
  };
  const isProven = !badge.hasPassword || current !== '';
  return (
    <form className="sp-panel" onSubmit={submit} noValidate aria-labelledby="own-pin">
      <header>
        <h2 id="own-pin">Badge and PIN</h2>
        <span className="muted">badge {badge.badge}</span>
      </header>
      {change.isError && (
        <p className="sp-problems" role="alert">
          {errorText(change.error)}
        </p>
      )}
      {change.isSuccess && (
        <p role="status">{change.variables.pin === null ? 'No PIN any more.' : 'PIN is set.'}</p>
      )}
      {badge.hasPassword && (
        <PasswordField
          id="pin-current"
          label="Current password"
          autoComplete="current-password"
          value={current}
          onChange={setCurrent}
        />
      )}
      <FormGroup
        label={badge.hasPin ? 'New PIN' : 'PIN'}
        labelFor="own-new-pin"
        helperText={problem ?? `${pinShortest} to ${pinLongest} digits, for phones that a crew shares`}
        intent={problem === null ? 'none' : 'danger'}
      >
        <InputGroup
          id="own-new-pin"
          type="password"
          inputMode="numeric"
          autoComplete="new-password"
          value={pin}
          onValueChange={(text) => setPin(digitsOnly(text))}
          aria-invalid={problem !== null}
        />
      </FormGroup>
      <div className="sp-actions">
        <Button type="submit" intent="primary" loading={change.isPending} disabled={!isProven || pin === ''}>
          {badge.hasPin ? 'Change PIN' : 'Set PIN'}
        </Button>
        {badge.hasPin && (
          <Button disabled={!isProven || change.isPending} onClick={() => send(null)}>
            Take PIN away
          </Button>
        )}
      </div>
    </form>
  );
}
