// The plain frame of every page that a stand-in shows to a person: one style sheet, no script, readable in light and dark.

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

export const escapeHtml = (text: string): string =>
  text.replace(/[&<>"']/g, (mark) => ENTITIES[mark] ?? mark);

export const dollars = (cents: number, currency = 'usd'): string =>
  new Intl.NumberFormat('en-US', { style: 'currency', currency: currency.toUpperCase() }).format(cents / 100);

const STYLE = `
:root { color-scheme: light dark; --paper:#f3f5f9; --card:#fff; --ink:#16202e; --soft:#4b596d; --line:#c4cddb; --key:#1f4fa3; --on-key:#fff; --bad:#9c1c3b; --bad-paper:#fdeef1; --good:#14613f; --good-paper:#e9f6ef }
@media (prefers-color-scheme: dark) { :root { --paper:#10151d; --card:#19212c; --ink:#eef2f8; --soft:#b3bfd0; --line:#3c495b; --key:#9dbdff; --on-key:#0e1a30; --bad:#ffb3c1; --bad-paper:#3a1620; --good:#9be3bd; --good-paper:#12301f } }
* { box-sizing: border-box }
body { margin:0; background:var(--paper); color:var(--ink); font:16px/1.5 system-ui, sans-serif }
.banner { padding:.6rem 1rem; background:var(--ink); color:var(--paper); text-align:center; font-size:.9rem }
main { max-width:60rem; margin:0 auto; padding:2rem 1rem 4rem }
h1 { font-size:1.6rem; line-height:1.2; margin:0 0 1rem } h2 { font-size:1.05rem; margin:0 0 .75rem }
a { color:var(--key) } p { margin:0 0 1rem }
.columns { display:grid; gap:1.5rem; grid-template-columns:minmax(0,1fr) minmax(0,1fr); align-items:start } .columns.reading { grid-template-columns:minmax(0,3fr) minmax(0,2fr) }
@media (max-width: 44rem) { .columns, .columns.reading { grid-template-columns:minmax(0,1fr) } main { padding-top:1.25rem } }
.card { background:var(--card); border:1px solid var(--line); border-radius:.5rem; padding:1.25rem }
.card + .card, .card + .columns { margin-top:1.25rem } .card > p:last-child { margin-bottom:0 }
.soft { color:var(--soft) } .number { font-variant-numeric:tabular-nums; text-align:right; white-space:nowrap }
table { width:100%; border-collapse:collapse } th, td { text-align:left; padding:.5rem .75rem .5rem 0; border-bottom:1px solid var(--line); vertical-align:top; overflow-wrap:anywhere }
th.number, td.number { padding-right:0; text-align:right } tfoot th, tfoot td { border-bottom:0; font-weight:700; font-size:1.15rem }
label { display:block; font-weight:600; margin-bottom:.25rem } .field { margin-bottom:1rem } .pair { display:grid; grid-template-columns:1fr 1fr; gap:1rem; align-items:start }
input { width:100%; font:inherit; color:inherit; background:var(--card); border:1px solid var(--soft); border-radius:.35rem; padding:.7rem .75rem; min-height:3rem }
input[aria-invalid="true"] { border:2px solid var(--bad) } .wrong { color:var(--bad); margin:.3rem 0 0; font-size:.95rem }
:focus-visible { outline:3px solid var(--key); outline-offset:2px }
button, .button { display:inline-block; font:inherit; font-weight:700; text-decoration:none; text-align:center; border:0; border-radius:.35rem; padding:.8rem 1.25rem; min-height:3rem; background:var(--key); color:var(--on-key); cursor:pointer }
button.wide { width:100%; max-width:28rem } button.plain { background:none; color:var(--key); border:1px solid currentColor }
.notice { border-left:4px solid var(--soft); padding:.75rem 1rem; background:var(--card); margin-bottom:1.25rem } .notice.bad { border-color:var(--bad); background:var(--bad-paper); color:var(--bad) } .notice.good { border-color:var(--good); background:var(--good-paper); color:var(--good) } .notice p:last-child { margin:0 }
.foot { margin-top:1.25rem; text-align:center } code { font-size:.95em; white-space:nowrap }
iframe { width:100%; height:34rem; border:1px solid var(--line); border-radius:.35rem; background:#fff } pre { white-space:pre-wrap; overflow-wrap:anywhere; font:inherit; margin:0 }
dl { display:grid; grid-template-columns:max-content minmax(0,1fr); gap:.35rem 1rem; margin:0 } dt { color:var(--soft) } dd { margin:0; overflow-wrap:anywhere }
`;

/** @param body trusted HTML: whatever came from outside is escaped by whoever writes it */
export const page = (title: string, banner: string, body: string): string => `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${escapeHtml(title)}</title>
<style>${STYLE}</style>
</head>
<body>
<header class="banner">${escapeHtml(banner)}</header>
<main>
${body}
</main>
</body>
</html>
`;
