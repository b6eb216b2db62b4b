/** A mail before it is drawn: the same order for html and plain text. */
export interface MailDraft {
  language: string;
  /** What kind of thing it is, at the right of the head: Booked. */
  tag: string;
  subject: string;
  /** What happened and what to do by when. */
  lead: string;
  /** At most four ruled cells. */
  cells: Array<{ label: string; value: string; more?: string }>;
  act: { words: string; url: string };
  /** What follows the act, a sentence each. */
  notes: string[];
  foot: string[];
}

const entities: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

export function escapeHtml(text: string): string {
  return text.replaceAll(/[&<>"']/g, (sign) => entities[sign] ?? sign);
}

const font = "font-family:'IBM Plex Sans',-apple-system,'Segoe UI',Roboto,Arial,sans-serif";

/** One column, one frame, four ruled cells, one act; works with pictures off, forces no colours on dark clients beyond its own. */
export function htmlOf(mail: MailDraft): string {
  const e = escapeHtml;
  const p = (text: string, style = '') => `<p style="margin:0 0 14px;${style}">${e(text)}</p>`;
  return `<!doctype html><html lang="${e(mail.language)}"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><title>${e(mail.subject)}</title></head>
<body style="margin:0;padding:16px"><table role="presentation" width="100%" cellspacing="0" cellpadding="0"><tr><td align="center">
<table role="presentation" width="100%" cellspacing="0" cellpadding="0" style="max-width:640px;border:1px solid #1C1A22;border-collapse:collapse;${font};font-size:16px;line-height:24px;text-align:left">
<tr><td style="padding:12px 24px;border-bottom:1px solid #1C1A22"><strong>Holdwater</strong></td><td align="right" style="padding:12px 24px;border-bottom:1px solid #1C1A22;font-size:14px">${e(mail.tag)}</td></tr>
<tr><td colspan="2" style="padding:20px 24px 6px"><h1 style="margin:0 0 10px;font-size:24px;line-height:30px">${e(mail.subject)}</h1>${p(mail.lead)}
${mail.cells.length > 0 ? cellsHtml(mail.cells) : ''}
<p style="margin:0 0 18px"><a href="${e(mail.act.url)}" style="display:inline-block;padding:8px 16px;border:1px solid #5B2C90;border-bottom:3px double #5B2C90;color:#5B2C90;font-weight:600;text-decoration:none">${e(mail.act.words)}</a></p>
${mail.notes.map((note) => p(note, 'font-size:15px')).join('\n')}</td></tr>
<tr><td colspan="2" style="padding:12px 24px;border-top:1px solid #82877F;font-size:13px;line-height:19px">${mail.foot.map(e).join('<br>')}</td></tr>
</table></td></tr></table></body></html>`;
}

function cellsHtml(cells: MailDraft['cells']): string {
  const cell = ({ label, value, more }: MailDraft['cells'][number]) =>
    `<td width="50%" valign="top" style="padding:8px 12px;border:1px solid #82877F"><span style="font-size:13px">${escapeHtml(label)}</span><br><strong>${escapeHtml(value)}</strong>${more ? `<br>${escapeHtml(more)}` : ''}</td>`;
  const rows: string[] = [];
  for (let i = 0; i < cells.length; i += 2)
    rows.push(
      `<tr>${cells
        .slice(i, i + 2)
        .map(cell)
        .join('')}</tr>`,
    );
  return `<table role="presentation" width="100%" cellspacing="0" cellpadding="0" style="border-collapse:collapse;margin:0 0 18px">${rows.join('')}</table>`;
}

/** The plain-text twin. */
export function textOf(mail: MailDraft): string {
  const width = Math.max(...mail.cells.map(({ label }) => label.length), 0) + 2;
  const cells = mail.cells.flatMap(({ label, value, more }) => [
    `${label.padEnd(width)}${value}`,
    ...(more ? [' '.repeat(width) + more] : []),
  ]);
  return [
    mail.subject,
    '',
    mail.lead,
    '',
    ...cells,
    ...(cells.length > 0 ? [''] : []),
    `${mail.act.words}:`,
    mail.act.url,
    '',
    ...mail.notes,
    '',
    ...mail.foot,
    '',
  ].join('\n');
}
