import { Dialog, DialogBody } from '@blueprintjs/core';
import type { FoundTurn } from '@stubpost/shared';
import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useId, useRef, useState, type KeyboardEvent } from 'react';
import { useNavigate } from 'react-router-dom';
import { errorText } from '../../../lib/error-texts';
import { findTurnsQuery } from '../api/find-turns';
import styles from './find-dialog.module.css';

const MATCHED_WORDS: Record<FoundTurn['matched'], string> = {
  train: 'train',
  set: 'set',
  car: 'car',
  person: 'person',
  track: 'track',
};

function countWords(text: string, found: readonly FoundTurn[] | undefined): string {
  if (text.trim() === '') return 'Type part of a train number, set, car, name or track.';
  if (found === undefined) return 'Looking';
  if (found.length === 0) return `Nothing here fits “${text.trim()}”.`;
  return found.length === 1 ? '1 turn' : `${found.length} turns`;
}

/** Moves the choice by the keys of a list under a field; null when the key is not for the list. */
function nextChoice(key: string, chosen: number, count: number): number | null {
  if (count === 0) return null;
  if (key === 'ArrowDown') return (chosen + 1) % count;
  if (key === 'ArrowUp') return (chosen - 1 + count) % count;
  return null;
}

export interface FindDialogProps {
  terminal: string;
  isOpen: boolean;
  onClose: () => void;
}

function FindBody({ terminal, onClose }: Omit<FindDialogProps, 'isOpen'>) {
  const [text, setText] = useState('');
  const [chosen, setChosen] = useState(0);
  const listId = useId();
  const navigate = useNavigate();
  const { data, error } = useQuery({ ...findTurnsQuery(terminal, text), placeholderData: keepPreviousData });
  const found = text.trim() === '' ? [] : (data ?? []);
  const open = (turn: FoundTurn | undefined): void => {
    if (turn === undefined) return;
    onClose();
    void navigate(`/turns/${turn.turnId}?terminal=${encodeURIComponent(turn.terminal)}`);
  };
  const onKeyDown = (event: KeyboardEvent): void => {
    if (event.key === 'Enter') open(found[chosen]);
    const next = nextChoice(event.key, chosen, found.length);
    if (next === null) return;
    event.preventDefault();
    setChosen(next);
  };

  return (
    <DialogBody className={styles.body ?? ''}>
      <label htmlFor={`${listId}-field`}>Train, set, car, person or track</label>
      <input
        id={`${listId}-field`}
        className={`bp6-input bp6-large ${styles.field}`}
        role="combobox"
        aria-expanded={found.length > 0}
        aria-controls={listId}
        aria-autocomplete="list"
        aria-activedescendant={found.length > 0 ? `${listId}-${chosen}` : undefined}
        autoComplete="off"
        autoFocus
        value={text}
        onChange={(event) => {
          setText(event.target.value);
          setChosen(0);
        }}
        onKeyDown={onKeyDown}
      />
      <p role="status" className="muted">
        {error === null ? countWords(text, text.trim() === '' ? [] : data) : errorText(error)}
      </p>
      <ul id={listId} role="listbox" aria-label="Turns that fit" className={styles.list}>
        {found.map((turn, index) => (
          <li
            key={turn.turnId}
            id={`${listId}-${index}`}
            role="option"
            aria-selected={index === chosen}
            onClick={() => open(turn)}
            onPointerMove={() => setChosen(index)}
          >
            <span>{turn.text}</span>
            <span className="muted small">{MATCHED_WORDS[turn.matched]}</span>
          </li>
        ))}
      </ul>
    </DialogBody>
  );
}

/** Find a turn from anywhere: three keys and Enter. */
export function FindDialog({ terminal, isOpen, onClose }: FindDialogProps) {
  const opener = useRef<Element | null>(null);
  // Asked while drawing, before the field inside takes the focus.
  if (isOpen && opener.current === null) opener.current = document.activeElement;
  return (
    <Dialog
      isOpen={isOpen}
      onClose={onClose}
      title="Find"
      className={styles.dialog ?? ''}
      transitionDuration={0}
      onClosed={() => {
        if (opener.current instanceof HTMLElement) opener.current.focus();
        opener.current = null;
      }}
    >
      <FindBody terminal={terminal} onClose={onClose} />
    </Dialog>
  );
}
