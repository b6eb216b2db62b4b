/** Markup that is safe to put into a page as it is. */
export class Html {
  constructor(readonly markup: string) {}
}

type Value = Html | string | number | null | undefined | false | Value[];

/** Builds markup; everything put in is escaped, but for markup this function made itself. */
export function html(parts: TemplateStringsArray, ...values: Value[]): Html {
  return new Html(parts.reduce((sofar, part, index) => sofar + toMarkup(values[index - 1]) + part));
}

function toMarkup(value: Value): string {
  if (value === null || value === undefined || value === false) return '';
  if (Array.isArray(value)) return value.map(toMarkup).join('');
  return value instanceof Html ? value.markup : escapeHtml(String(value));
}

/** For text between tags and in double-quoted attributes. */
export function escapeHtml(text: string): string {
  return text
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;')
    .replaceAll("'", '&#39;');
}

const address = /https?:\/\/[^\s<>"']+[^\s<>"'.,;:!?)\]]/g;

/** Text with its web addresses as links that open a tab of their own. */
export function withLinks(text: string): Html {
  const pieces: Html[] = [];
  let from = 0;
  for (const match of text.matchAll(address)) {
    pieces.push(
      html`${text.slice(from, match.index)}<a href="${match[0]}" target="_blank" rel="noopener noreferrer"
          >${match[0]}</a
        >`,
    );
    from = match.index + match[0].length;
  }
  return html`${pieces}${text.slice(from)}`;
}
