/** The path without its query, and with the token of a one-time link taken out. */
export function pathForLog(url: string): string {
  const [path = ''] = url.split('?');
  return path.replace(/^(\/api\/links\/|\/link\/).+/, '$1…');
}
