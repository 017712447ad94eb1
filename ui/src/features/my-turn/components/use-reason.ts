import { useState } from 'react';

/** A reason being given: chosen by touch or put in words. */
export function useReason() {
  const [chosen, setChosen] = useState<string | null>(null);
  const [typed, setTyped] = useState('');
  const words = typed.trim();
  return {
    /** What goes into the log; empty while nothing is given. */
    reason: words === '' ? (chosen ?? '') : words,
    field: {
      chosen,
      typed,
      onChosen: (each: string) => {
        setChosen(each);
        setTyped('');
      },
      onTyped: setTyped,
    },
  };
}
