import { type RouteSpec, rolesWith } from '@stubpost/shared';
import { z } from 'zod';
import { refusalStatusesOf } from './openapi';

const signs: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

function escaped(text: string): string {
  return text.replace(/[&<>"']/g, (sign) => signs[sign] ?? sign);
}

/** The interface as a page to read: no script, works with style sheets off. */
export function docsPage(routes: readonly RouteSpec[], version: string): string {
  const areas = [...new Set(routes.map((route) => route.area))];
  const sections = areas
    .map((area) =>
      sectionOf(
        area,
        routes.filter((route) => route.area === area),
      ),
    )
    .join('\n');
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>Stubpost interface</title>
<style>${style}</style>
</head>
<body>
<main>
<h1>Stubpost interface, version ${escaped(version)}</h1>
<p>REST and JSON. Times are ISO 8601 in UTC with <code>Z</code>, service dates <code>YYYY-MM-DD</code>, durations whole
seconds. A refusal is <code>{ "code", "message", "facts", "requestId" }</code>. Sign in with
<code>POST /api/session</code>; the cookie it sets goes with every further request. The same as a document for programs:
<a href="/api/openapi.json">openapi.json</a>.</p>
<nav aria-label="Areas"><ul>${areas.map((area) => `<li><a href="#${anchorOf(area)}">${escaped(area)}</a></li>`).join('')}</ul></nav>
${sections}
</main>
</body>
</html>
`;
}

const style = `
:root { color-scheme: light dark; }
body { font: 16px/1.5 system-ui, sans-serif; margin: 0; }
main { max-width: 56rem; margin: 0 auto; padding: 1rem; }
nav ul { display: flex; flex-wrap: wrap; gap: 0.25rem 1rem; list-style: none; padding: 0; }
article { border-top: 1px solid GrayText; padding: 0.5rem 0 1rem; }
h3 { font-family: ui-monospace, monospace; font-size: 1rem; margin: 0.5rem 0; overflow-wrap: anywhere; }
pre { overflow-x: auto; padding: 0.5rem; border: 1px solid GrayText; }
a { color: LinkText; }
`;

function anchorOf(area: string): string {
  return area.toLowerCase().replace(/[^a-z0-9]+/g, '-');
}

function sectionOf(area: string, routes: readonly RouteSpec[]): string {
  return `<section aria-labelledby="${anchorOf(area)}"><h2 id="${anchorOf(area)}">${escaped(area)}</h2>
${routes.map(articleOf).join('\n')}</section>`;
}

function articleOf(route: RouteSpec): string {
  const who = route.permission === 'public' ? 'anybody' : rolesOf(route);
  const refusals = refusalStatusesOf(route);
  return `<article>
<h3>${escaped(`${route.method} ${route.path}`)}</h3>
<p>${escaped(route.summary)}. For ${escaped(who)}. Answers ${route.status ?? 200}${
    refusals.length === 0 ? '' : `, or ${refusals.join(', ')}`
  }.</p>
${schemaBlock('Query', route.query, 'input')}${schemaBlock('Request', route.request, 'input')}${schemaBlock('Answer', route.response, 'output')}
</article>`;
}

function rolesOf(route: RouteSpec): string {
  if (route.permission === 'public') return 'anybody';
  return route.permission === 'session'
    ? 'everybody who is signed in'
    : rolesWith(route.permission).join(', ');
}

function schemaBlock(title: string, schema: z.ZodType | string | undefined, io: 'input' | 'output'): string {
  if (schema === undefined) return '';
  if (typeof schema === 'string') return `<p>${title}: <code>${escaped(schema)}</code></p>`;
  const { $schema: _dialect, ...json } = z.toJSONSchema(schema, { io, unrepresentable: 'any' });
  return `<details><summary>${title}</summary><pre>${escaped(JSON.stringify(json, null, 1))}</pre></details>`;
}
