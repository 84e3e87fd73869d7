/** Text that is safe inside HTML and inside quoted attributes. */
export function escapeHtml(text: string): string {
  const entities: Record<string, string> = {
    '&': '&amp;',
    '<': '&lt;',
    '>': '&gt;',
    '"': '&quot;',
    "'": '&#39;',
  };
  return text.replace(/[&<>"']/g, (character) => entities[character] ?? character);
}

const STYLE = `
:root { color-scheme: light dark; --shell: #f3efe6; --paper: #fdfbf6; --field: #ffffff; --ink: #191c1f; --ink-2: #4b5257;
  --line: #ddd6c7; --edge: #5f676c; --hot: #b8461f; --on-hot: #ffffff; --alarm: #a61b1b; }
@media (prefers-color-scheme: dark) {
  :root { --shell: #14181a; --paper: #1c2225; --field: #22292d; --ink: #f0eadc; --ink-2: #c4cacb;
    --line: #343d42; --edge: #9aa3a6; --hot: #e08a4b; --on-hot: #14181a; --alarm: #f08a80; }
}
* { box-sizing: border-box; }
body { margin: 0; background: var(--shell); color: var(--ink); font: 1rem/1.5 system-ui, sans-serif; }
main { max-width: 30rem; margin: 0 auto; padding: 0 1rem 3rem; }
.notice { margin: 0; padding: .625rem 1rem; background: var(--ink); color: var(--shell); text-align: center; font-weight: 600; }
h1 { margin: 2rem 0 .25rem; font-size: 1.25rem; }
h2 { margin: 2rem 0 .5rem; font-size: 1rem; }
.amount { margin: 0 0 1.25rem; font: 600 2rem/1.2 ui-monospace, monospace; font-variant-numeric: tabular-nums; }
.lines { margin: 0 0 1.5rem; padding: 0; list-style: none; border-top: 1px solid var(--line); }
.lines li { display: flex; gap: 1rem; justify-content: space-between; padding: .5rem 0; border-bottom: 1px solid var(--line); }
.lines .sum { font-family: ui-monospace, monospace; white-space: nowrap; }
label { display: block; margin: 1rem 0 .25rem; font-weight: 600; }
input { width: 100%; min-height: 2.75rem; padding: .5rem .75rem; border: 1px solid var(--edge); border-radius: 4px;
  background: var(--field); color: var(--ink); font: inherit; }
input[aria-invalid] { border: 2px solid var(--alarm); }
.pair { display: grid; grid-template-columns: 1fr 1fr; gap: 1rem; }
.hint { margin: .25rem 0 0; color: var(--ink-2); font-size: .875rem; }
.problem { margin: 1rem 0; padding: .75rem 1rem; border: 2px solid var(--alarm); border-radius: 4px; background: var(--paper);
  color: var(--alarm); font-weight: 600; }
button, .button { display: block; width: 100%; min-height: 2.75rem; margin: .75rem 0 0; padding: .625rem 1rem; border: 1px solid var(--edge);
  border-radius: 4px; background: var(--paper); color: var(--ink); font: inherit; font-weight: 600; text-align: center;
  text-decoration: none; cursor: pointer; }
button.first { margin-top: 1.5rem; border-color: var(--hot); background: var(--hot); color: var(--on-hot); }
a { color: var(--ink); }
:focus-visible { outline: 3px solid var(--hot); outline-offset: 2px; }
fieldset { margin: 2rem 0 0; padding: 1rem; border: 1px solid var(--line); border-radius: 4px; background: var(--paper); }
legend { padding: 0 .5rem; font-weight: 600; }
table { width: 100%; border-collapse: collapse; font-size: .9375rem; }
th, td { padding: .375rem .5rem .375rem 0; border-bottom: 1px solid var(--line); text-align: left; vertical-align: top; }
td.number { font-family: ui-monospace, monospace; white-space: nowrap; }
`;

/** A whole page; `body` is HTML. */
export function renderPage(title: string, body: string): string {
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="robots" content="noindex">
<title>${escapeHtml(title)}</title>
<style>${STYLE}</style>
</head>
<body>
<header><p class="notice">Local test payments. No real card is charged.</p></header>
<main>
${body}
</main>
</body>
</html>
`;
}

/** A page that says one thing and leads on. */
export function renderMessage(
  title: string,
  text: string,
  link: { href: string; label: string } | null,
): string {
  const onward =
    link === null ? '' : `<a class="button" href="${escapeHtml(link.href)}">${escapeHtml(link.label)}</a>`;
  return renderPage(title, `<h1>${escapeHtml(title)}</h1>\n<p>${escapeHtml(text)}</p>\n${onward}`);
}
