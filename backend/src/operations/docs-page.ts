import type { ServedRoute } from './openapi.js';

const entities: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };
const escape = (text: string) => text.replaceAll(/[&<>"]/g, (sign) => entities[sign] ?? sign);

const who: Record<ServedRoute['access']['kind'], string> = {
  anyone: 'anyone',
  'signed-in': 'signed in',
  operator: 'operator',
};

const style = `
  body{margin:0;background:#ECEEEB;color:#1C1A22;font:400 14px/20px "IBM Plex Sans",system-ui,sans-serif}
  main{margin:10px;border:1px solid #1C1A22;background:#FDFDFB}
  header,h2,p.foot{padding:12px 16px;margin:0;border-bottom:1px solid #1C1A22}
  h1{margin:0;font-size:20px;line-height:26px}h2{font-size:16px;line-height:22px}
  table{border-collapse:collapse;width:100%}td{padding:4px 16px;border-bottom:1px solid #D2D5CF;vertical-align:top}
  code{font-family:"IBM Plex Mono",ui-monospace,monospace;overflow-wrap:anywhere}a{color:#5B2C90}
  @media(max-width:719px){tr{display:block;border-bottom:1px solid #D2D5CF;padding:6px 0}td{display:block;border:0;padding:1px 14px}}`;

/** Every route in a few words, for a person; the whole of it is `/api/openapi.json`. */
export function docsPage(routes: readonly ServedRoute[], nonce: string): string {
  const groups = groupBy(routes);
  const sections = [...groups].map(
    ([name, each]) => `<h2>${escape(name)}</h2><table><tbody>${each.map(rowOf).join('')}</tbody></table>`,
  );
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width,initial-scale=1">
<title>Holdwater API</title><style nonce="${nonce}">${style}</style></head><body><main><header><h1>Holdwater API</h1>
<p>Bearer token from <code>POST /api/auth/sign-in</code>. Errors are one shape: <code>code, message, params, fields, entry</code>.
Writes may carry an <code>Idempotency-Key</code>. The whole of it: <a href="/api/openapi.json">openapi.json</a>.</p></header>${sections.join('')}</main></body></html>`;
}

const groupOf = ({ contract }: ServedRoute) => contract.path.split('/')[2] ?? '';

function groupBy(routes: readonly ServedRoute[]): Map<string, ServedRoute[]> {
  const groups = new Map<string, ServedRoute[]>();
  for (const route of routes) groups.set(groupOf(route), [...(groups.get(groupOf(route)) ?? []), route]);
  return groups;
}

function rowOf({ contract, access }: ServedRoute): string {
  return `<tr><td><code>${contract.method}</code></td><td><code>${escape(contract.path)}</code></td><td>${escape(contract.summary)}</td><td>${who[access.kind]}</td></tr>`;
}
