import type { Role } from '@shared/model/people';
import { type Action, isPublic, PERMISSIONS, type Scope } from '@shared/permissions/permissions';

import type { Route } from '../../http/route';

/** A page that a person can read, without a script: every address, what it is for, who may use it. */
export function apiPage(routes: readonly Route[]): string {
  const rows = [...routes]
    .sort((a, b) => a.path.localeCompare(b.path))
    .map(
      (route) =>
        `<tr><td><code>${route.method.toUpperCase()}</code></td>` +
        `<td><code>${escape(route.path)}</code></td><td>${escape(route.summary)}</td>` +
        `<td>${escape(whoMay(route.action))}</td></tr>`,
    );
  return `<!doctype html>
<html lang="en">
<head><meta charset="utf-8"><title>Limen: the API</title></head>
<body>
<h1>The API of Limen</h1>
<p>The whole contract with every field: <a href="/api/openapi.json">openapi.json</a> (OpenAPI 3.1).</p>
<table border="1" cellpadding="6">
<thead><tr><th>Method</th><th>Address</th><th>What it does</th><th>Who may</th></tr></thead>
<tbody>
${rows.join('\n')}
</tbody>
</table>
</body>
</html>
`;
}

function whoMay(action: Action): string {
  if (isPublic(action)) return 'anyone';
  const rule: { scope?: Scope; grants?: Readonly<Partial<Record<Role, Scope>>> } =
    PERMISSIONS[action];
  if (!rule.grants) return 'anyone signed in';
  return Object.entries(rule.grants)
    .map(([role, scope]) => `${role} (${scope})`)
    .join(', ');
}

function escape(text: string): string {
  return text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;');
}
