import { rules, type Rule } from '#shared/access/index.ts';
import { problemCodes, type Contract } from '#shared/contracts/index.ts';
import { contracts } from '#shared/contracts/registry.ts';
import { whoMay } from './describe.ts';

const escapes: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };
const text = (value: string) => value.replaceAll(/[&<>"]/g, (sign) => escapes[sign] ?? sign);
const json = (value: unknown) => `<pre tabindex="0">${text(JSON.stringify(value, null, 2))}</pre>`;

/** The description of the API for reading: one page without script, styled by a sheet of its own. */
export function docsPage(): string {
  const resources = [...new Set(contracts.map(({ resource }) => resource))];
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>API · Ledgerbeam</title>
<link rel="stylesheet" href="/api/docs.css">
</head>
<body>
<header><h1>Ledgerbeam API</h1>
<p>Everything the screens do goes through these addresses. The same description for programs:
<a href="/api/openapi.json">OpenAPI 3.1</a>.</p></header>
<nav aria-label="Resources"><ul>${resources.map((name) => `<li><a href="#${name}">${name}</a></li>`).join('')}</ul></nav>
<main>
${resources.map(section).join('\n')}
<section id="problems"><h2>problems</h2>
<p>Whatever is not a success is a problem document (RFC 9457, <code>application/problem+json</code>) with a
<code>code</code>, a sentence for people in <code>detail</code>, and for inputs every place in <code>errors</code>,
by JSON pointer.</p>
<dl>${Object.entries(problemCodes)
    .map(
      ([code, { status, title }]) => `<dt id="${code}"><code>${code}</code> ${status}</dt><dd>${title}.</dd>`,
    )
    .join('\n')}</dl></section>
</main>
<footer><p>Results are a calculation aid: loads, assumptions and results are to be checked and adopted by a suitably
qualified (where the law asks, licensed) engineer against the codes in force at the site.</p></footer>
</body>
</html>`;
}

function section(resource: string): string {
  const own = contracts.filter((each) => each.resource === resource).map(({ contract }) => contract);
  return `<section id="${resource}"><h2>${resource}</h2>${own.map(endpoint).join('\n')}</section>`;
}

function endpoint({
  name,
  method,
  path,
  summary,
  action,
  query,
  body,
  example,
  output,
  status,
}: Contract): string {
  const { who }: Rule = rules[action];
  const asked = Object.keys(query.properties);
  return `<article id="${name}">
<h3><span class="method">${method}</span> <code>/api${text(path)}</code></h3>
<p>${text(summary)}.</p>
<p class="who">For ${whoMay(who)} <code>${action}</code></p>
${asked.length > 0 ? `<details><summary>Query: ${asked.join(', ')}</summary>${json(query.properties)}</details>` : ''}
${body ? `<details><summary>Body</summary>${json(body)}</details><details><summary>Example</summary>${json(example)}</details>` : ''}
${output ? `<details><summary>Answer ${status}</summary>${json(output)}</details>` : `<p>Answers ${status}, with nothing to read.</p>`}
</article>`;
}

/** Paper and ink, dark where the reader's system is. */
export const docsStyles = `
:root { color-scheme: light dark; --paper: #f7f4ec; --ink: #23211c; --faint: #5d584c; --line: #d8d2c2; --mark: #8a3b12; }
@media (prefers-color-scheme: dark) {
  :root { --paper: #1c1b18; --ink: #ece7da; --faint: #b0a995; --line: #3d3a32; --mark: #e8a06f; }
}
* { box-sizing: border-box; }
body { margin: 0 auto; max-width: 56rem; padding: 2rem 1.25rem 4rem; background: var(--paper); color: var(--ink);
  font: 1rem/1.55 system-ui, sans-serif; }
h1, h2 { font-family: Georgia, serif; font-weight: 600; }
h2 { margin-top: 3rem; border-bottom: 1px solid var(--line); padding-bottom: .3rem; }
h3 { margin: 1.75rem 0 .25rem; font-size: 1.05rem; }
p { margin: .25rem 0 .5rem; }
a { color: var(--mark); }
a:focus-visible, summary:focus-visible, pre:focus-visible { outline: 2px solid var(--mark); outline-offset: 2px; }
code, pre { font-family: ui-monospace, monospace; font-size: .9em; }
pre { overflow: auto; max-height: 24rem; border-left: 2px solid var(--line); padding: .5rem .75rem; }
nav ul { display: flex; flex-wrap: wrap; gap: .25rem 1.25rem; list-style: none; padding: 0; }
.method { font-family: ui-monospace, monospace; color: var(--mark); }
.who, dd, footer { color: var(--faint); }
dt { margin-top: .75rem; }
dd { margin: 0; }
footer { margin-top: 3rem; border-top: 1px solid var(--line); padding-top: 1rem; font-size: .9rem; }
`;
