import type { ReactNode } from 'react';

/** A sentence with weight, with the post before it. */
export function Caution({ children }: { children: ReactNode }) {
  return <p className="sp-caution">{children}</p>;
}

/** Stands wherever tests or securement are shown. */
export function SafetyCaution() {
  return (
    <Caution>
      Stubpost shows what was recorded, what the rule in force asks for, and what is missing. It never tells
      anyone that a train may move safely: that is decided by the railroad’s rules, the law in force and
      qualified people.
    </Caution>
  );
}
