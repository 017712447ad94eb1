/** The path without its query, and with the token of a link that works once taken out. */
export function pathForLog(url: string): string {
  const [path = ''] = url.split('?');
  return path.replace(/^(\/api\/links\/|\/links?\/|\/api\/takings\/|\/t\/).+/, '$1…');
}
