import { useEffect } from 'react';

/*
 * What would be lost if the page were loaded anew: forms that were begun. Fields count by themselves from the first
 * character until their form is sent or the page is left; parts without fields say so with `useUnsaved`.
 */
const held = new Set<symbol>();
const listeners = new Set<() => void>();
let typedOn: string | null = null;

function tell(): void {
  for (const listener of listeners) listener();
}

/** Whether a form on the page was begun and not sent. */
export function hasUnsaved(): boolean {
  return held.size > 0 || typedOn === location.pathname;
}

/** Calls back when that may have changed. */
export function onUnsavedChange(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** Marks something without fields as begun for as long as `isUnsaved` holds. */
export function useUnsaved(isUnsaved: boolean): void {
  useEffect(() => {
    if (!isUnsaved) return undefined;
    const token = Symbol('unsaved');
    held.add(token);
    tell();
    return () => {
      held.delete(token);
      tell();
    };
  }, [isUnsaved]);
}

/** Fields in which nothing is begun: what is typed there narrows what is shown. */
const LOOKING = 'input[type="search"], [role="combobox"]';

/** Watches the fields of all pages. Called once, before the first page is drawn. */
export function watchFields(): void {
  document.addEventListener('input', ({ target }) => {
    if (target instanceof Element && target.matches(LOOKING)) return;
    typedOn = location.pathname;
    tell();
  });
  document.addEventListener('submit', () => {
    typedOn = null;
    tell();
  });
}
