/** A piece of a mail, written once and sent as text and as HTML. */
export interface MailPart {
  heading?: string;
  text?: string;
  list?: string[];
  facts?: [name: string, value: string][];
  link?: string;
  label?: string;
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
  for (const item of part.list ?? []) lines.push(`- ${item}`);
  for (const [name, value] of part.facts ?? []) lines.push(`${name}: ${value}`);
  if (part.link !== undefined) lines.push(`${part.label ?? 'Link'}: ${part.link}`);
  return lines.join('\n');
}

function htmlOf(part: MailPart): string {
  const html: string[] = [];
  if (part.heading !== undefined) html.push(`<h2>${escaped(part.heading)}</h2>`);
  if (part.text !== undefined) html.push(`<p>${escaped(part.text).replace(/\n/g, '<br>')}</p>`);
  if (part.list !== undefined) {
    html.push(`<ul>${part.list.map((item) => `<li>${escaped(item)}</li>`).join('')}</ul>`);
  }
  if (part.facts !== undefined) {
    const rows = part.facts.map(
      ([name, value]) =>
        `<tr><th align="left">${escaped(name)}</th><td>${escaped(value)}</td></tr>`,
    );
    html.push(`<table>${rows.join('')}</table>`);
  }
  if (part.link !== undefined) {
    const label = escaped(part.label ?? part.link);
    html.push(`<p><a href="${escaped(part.link)}">${label}</a></p>`);
  }
  return html.join('\n');
}

/** Both bodies of a mail from the same parts, so that neither says more than the other. */
export function mailBody(parts: readonly MailPart[]): { textBody: string; htmlBody: string } {
  return {
    textBody: `${parts.map(textOf).join('\n\n')}\n`,
    htmlBody: `<!doctype html>\n<html lang="en"><body>\n${parts.map(htmlOf).join('\n')}\n</body></html>\n`,
  };
}
