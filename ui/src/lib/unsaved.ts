import { useEffect } from 'react';

/*
 * What would be lost if the page were loaded anew: forms that were begun. Fields count by themselves from the first
 * character until they are empty, sent or gone; parts without fields say so with `useUnsaved`.
 */
const held = new Set<symbol>();
const listeners = new Set<() => void>();
const typedIn = new Set<HTMLInputElement | HTMLTextAreaElement>();
/** How often it is looked whether a field that was typed in is still there: fields go without a word. */
const lookMilliseconds = 1000;

function tell(): void {
  for (const listener of listeners) listener();
}

/** Whether a form on the page was begun and not sent. */
export function hasUnsaved(): boolean {
  for (const field of typedIn) if (!field.isConnected) typedIn.delete(field);
  return held.size > 0 || [...typedIn].some((field) => field.value !== '');
}

/** Calls back when that may have changed. */
export function onUnsavedChange(listener: () => void): () => void {
  listeners.add(listener);
  const timer = setInterval(listener, lookMilliseconds);
  return () => {
    clearInterval(timer);
    listeners.delete(listener);
  };
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

const isField = (target: EventTarget | null): target is HTMLInputElement | HTMLTextAreaElement =>
  target instanceof HTMLInputElement || target instanceof HTMLTextAreaElement;

/** Watches the fields of all pages. Called once, before the first page is drawn. */
export function watchFields(): void {
  document.addEventListener('input', ({ target }) => {
    if (!isField(target) || target.matches(LOOKING)) return;
    typedIn.add(target);
    tell();
  });
  document.addEventListener('submit', ({ target }) => {
    for (const field of typedIn) if (target instanceof Node && target.contains(field)) typedIn.delete(field);
    tell();
  });
}
