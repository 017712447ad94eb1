import type { PictureItem } from './picture-scene';

/** What has to be told to the picture: items that are new or look different, and names of those that are gone. */
export interface ItemChanges {
  changed: PictureItem[];
  removed: string[];
}

/** The least that turns one drawing into the next. Unchanged items are left alone, so their elements stay the same. */
export function diffItems(
  before: ReadonlyMap<string, PictureItem>,
  after: readonly PictureItem[],
): ItemChanges {
  const kept = new Set<string>();
  const changed: PictureItem[] = [];
  for (const item of after) {
    kept.add(item.id);
    const known = before.get(item.id);
    if (known === undefined || !isSame(known, item)) changed.push(item);
  }
  return { changed, removed: [...before.keys()].filter((id) => !kept.has(id)) };
}

function isSame(a: PictureItem, b: PictureItem): boolean {
  return (
    a.start === b.start &&
    a.end === b.end &&
    a.className === b.className &&
    a.content === b.content &&
    a.group === b.group &&
    a.type === b.type
  );
}
