import { mailStyle } from './mail-style.ts';

/** A line of a list, alone or leading somewhere. */
export type MailItem = string | { text: string; link: string };

/** A piece of a mail, written once and sent as text and as HTML. */
export interface MailPart {
  heading?: string;
  text?: string;
  list?: MailItem[];
  facts?: [name: string, value: string][];
  link?: string;
  label?: string;
}

/** Why the reader gets the mail, and how to get no more of its kind. */
export interface MailFoot {
  why: string;
  unsubscribeLink: string;
  choicesLink: string;
}

const escapes: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};
const escaped = (text: string) => text.replace(/[&<>"']/g, (sign) => escapes[sign] ?? sign);

function textOf(part: MailPart): string {
  const lines: string[] = [];
  if (part.heading !== undefined) lines.push(part.heading);
  if (part.text !== undefined) lines.push(part.text);
  for (const item of part.list ?? []) {
    lines.push(typeof item === 'string' ? `- ${item}` : `- ${item.text}\n  ${item.link}`);
  }
  for (const [name, value] of part.facts ?? []) lines.push(`${name}: ${value}`);
  if (part.link !== undefined) lines.push(`${part.label ?? 'Link'}: ${part.link}`);
  return lines.join('\n');
}

const linked = (text: string, link: string) =>
  `<a href="${escaped(link)}" style="${mailStyle.link}">${escaped(text)}</a>`;

function htmlOf(part: MailPart): string {
  const html: string[] = [];
  if (part.heading !== undefined) {
    html.push(`<h2 style="${mailStyle.heading}">${escaped(part.heading)}</h2>`);
  }
  if (part.text !== undefined) {
    html.push(`<p style="${mailStyle.text}">${escaped(part.text).replace(/\n/g, '<br>')}</p>`);
  }
  if (part.list !== undefined) {
    const items = part.list.map((item) => {
      const inner = typeof item === 'string' ? escaped(item) : linked(item.text, item.link);
      return `<li style="${mailStyle.item}">${inner}</li>`;
    });
    html.push(`<ul style="${mailStyle.list}">${items.join('')}</ul>`);
  }
  if (part.facts !== undefined) {
    const rows = part.facts.map(
      ([name, value]) =>
        `<tr><th align="left" scope="row" style="${mailStyle.factName}">${escaped(name)}</th><td style="${mailStyle.factValue}">${escaped(value)}</td></tr>`,
    );
    html.push(`<table cellspacing="0" style="${mailStyle.facts}">${rows.join('')}</table>`);
  }
  if (part.link !== undefined) {
    const label = escaped(part.label ?? part.link);
    html.push(
      `<p style="${mailStyle.text}"><a href="${escaped(part.link)}" style="${mailStyle.button}">${label}</a></p>`,
    );
  }
  return html.join('\n');
}

/** Both bodies of a mail from the same parts, so that neither says more than the other. */
export function mailBody(
  parts: readonly MailPart[],
  foot: MailFoot,
): { textBody: string; htmlBody: string } {
  const { why, unsubscribeLink, choicesLink } = foot;
  return {
    textBody: `${parts.map(textOf).join('\n\n')}\n\n-- \n${why}\nNo more mails of this kind: ${unsubscribeLink}\nChoose your mails: ${choicesLink}\n`,
    htmlBody: `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="color-scheme" content="light"><meta name="viewport" content="width=device-width"></head>
<body style="${mailStyle.page}">
<div style="${mailStyle.sheet}">
<p style="${mailStyle.mark}">Fretline</p>
<div style="${mailStyle.content}">
${parts.map(htmlOf).join('\n')}
</div>
<p style="${mailStyle.foot}">${escaped(why)}<br>${linked('No more mails of this kind', unsubscribeLink)} · ${linked('Choose your mails', choicesLink)}</p>
</div>
</body></html>
`,
  };
}
