/** Parameters of an open turn that do not belong to the board under it. */
const own = ['terminal', 'page'];

/** Address of a turn's panel over the board of its terminal; what the board shows stays in it. */
export function panelAddress(turnId: string, terminal: string, query: URLSearchParams): string {
  const next = new URLSearchParams(query);
  next.set('terminal', terminal);
  next.delete('page');
  return `/turns/${encodeURIComponent(turnId)}?${next.toString()}`;
}

/** Address of a turn as a page of its own. */
export function fullPageAddress(turnId: string, terminal: string): string {
  return `/turns/${encodeURIComponent(turnId)}?terminal=${encodeURIComponent(terminal)}&page=full`;
}

/** Address of the board alone, as it was under the panel. */
export function boardAddress(terminal: string, query: URLSearchParams): string {
  const next = new URLSearchParams(query);
  for (const name of own) next.delete(name);
  const text = next.toString();
  return `/board/${encodeURIComponent(terminal)}${text === '' ? '' : `?${text}`}`;
}
