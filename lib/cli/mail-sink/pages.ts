import type { KeptLetter } from "@/lib/cli/mail-sink/letters";

const ENTITIES: Record<string, string> = { "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;", "'": "&#39;" };
const escape = (text: string): string => text.replace(/[&<>"']/g, (character) => ENTITIES[character] ?? character);

/** Addresses in a letter can be followed; everything else of it is text, whatever it says. */
function withLinks(text: string): string {
  return text
    .split(/(https?:\/\/[^\s<>"']+)/)
    .map((part, index) => (index % 2 === 1 ? `<a href="${escape(part)}" rel="noreferrer">${escape(part)}</a>` : escape(part)))
    .join("");
}

const day = new Intl.DateTimeFormat("en-GB", { dateStyle: "medium", timeStyle: "medium" });

const page = (title: string, body: string): string => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1">
<title>${escape(title)}</title><link rel="stylesheet" href="/style.css"></head><body>${body}</body></html>`;

/** All letters, newest first. */
export function listPage(letters: KeptLetter[]): string {
  const rows = letters.map((letter) =>
    `<tr><td><time datetime="${escape(letter.receivedAt)}">${day.format(new Date(letter.receivedAt))}</time></td><td>${escape(letter.to.join(", "))}</td>` +
    `<td><a href="/messages/${encodeURIComponent(letter.id)}">${escape(letter.subject || "(no subject)")}</a></td></tr>`);
  const table = `<table><thead><tr><th scope="col">Sent</th><th scope="col">To</th><th scope="col">Subject</th></tr></thead><tbody>${rows.join("")}</tbody></table>`;
  return page("Mail", `<main><h1>Mail</h1><p>Letters of this installation end here; none leaves this machine. Load the page again to see new ones.</p>${letters.length > 0 ? table : "<p>No letter has been sent yet.</p>"}</main>`);
}

/** One letter as plain text. */
export function letterPage(letter: KeptLetter): string {
  return page(letter.subject || "Letter", `<main><p><a href="/">All letters</a></p><h1>${escape(letter.subject || "(no subject)")}</h1>
<dl><dt>From</dt><dd>${escape(letter.from)}</dd><dt>To</dt><dd>${escape(letter.to.join(", "))}</dd><dt>Sent</dt><dd>${day.format(new Date(letter.receivedAt))}</dd></dl>
<pre>${withLinks(letter.text)}</pre><p><a href="/messages/${encodeURIComponent(letter.id)}.eml">As it was sent</a></p></main>`);
}

export const missingPage = (): string => page("Not here", `<main><h1>No such letter</h1><p><a href="/">All letters</a></p></main>`);

export const STYLE = `:root{color-scheme:light dark;--ink:light-dark(#1c2226,#e8ebec);--paper:light-dark(#fbfaf7,#15191c);--line:light-dark(#cfd3d4,#3a4247);--link:light-dark(#0b5577,#7cc4e6)}
body{margin:0;background:var(--paper);color:var(--ink);font:1rem/1.5 system-ui,sans-serif}
main{max-width:60rem;margin:0 auto;padding:1.5rem 1rem}
h1{font-size:1.5rem;line-height:1.25;overflow-wrap:anywhere}
a{color:var(--link)}a:focus-visible{outline:3px solid;outline-offset:2px}
table{width:100%;border-collapse:collapse}th,td{text-align:left;vertical-align:top;padding:.6rem .75rem .6rem 0;border-bottom:1px solid var(--line);overflow-wrap:anywhere}
dl{display:grid;grid-template-columns:auto 1fr;gap:.25rem 1rem}dd{margin:0;overflow-wrap:anywhere}
pre{white-space:pre-wrap;overflow-wrap:anywhere;font:inherit;border-block:1px solid var(--line);padding-block:1rem}`;
