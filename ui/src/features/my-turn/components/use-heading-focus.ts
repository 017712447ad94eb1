import { useEffect, useRef } from 'react';

/** Moves the focus to the heading of a page that has just come up, so that it is read out and the keys go on from there. */
export function useHeadingFocus() {
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => {
    heading.current?.focus();
  }, []);
  return heading;
}
