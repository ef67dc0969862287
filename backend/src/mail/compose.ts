// One description of a mail, written out twice: as plain text and as HTML that needs no picture, script or style sheet.

export interface MailBody {
  subject: string;
  /** Plain sentences; no markup. */
  paragraphs: readonly string[];
  /** What the mail is for, where it asks for something. */
  link?: { label: string; url: string };
  /** After the link. */
  closing?: readonly string[];
}

export interface WrittenMail {
  subject: string;
  text: string;
  html: string;
}

const footer = 'Tiltwright writes only when something happens to your account or to what you sent in.';

/** Text wrapped by the reader's own program; the HTML holds nothing from elsewhere and no text unescaped. */
export function writeMail({ subject, paragraphs, link, closing = [] }: MailBody): WrittenMail {
  const text = [...paragraphs, ...(link ? [`${link.label}:\n${link.url}`] : []), ...closing, `-- \n${footer}`].join('\n\n');
  const html = [
    '<!doctype html><html lang="en"><head><meta charset="utf-8">',
    `<title>${escapeHtml(subject)}</title></head>`,
    '<body style="margin:0;padding:24px;background:#fcfaf4;color:#17242e;font:16px/24px sans-serif">',
    ...paragraphs.map(paragraph),
    link
      ? `<p style="margin:0 0 16px"><a href="${escapeHtml(link.url)}" style="color:#17242e">${escapeHtml(link.label)}</a></p>` +
        `<p style="margin:0 0 16px;color:#4c5b66;word-break:break-all">${escapeHtml(link.url)}</p>`
      : '',
    ...closing.map(paragraph),
    `<p style="margin:24px 0 0;padding-top:12px;border-top:1px solid #cfc8b8;color:#4c5b66">${escapeHtml(footer)}</p>`,
    '</body></html>',
  ].join('\n');
  return { subject: oneLine(subject), text: `${text}\n`, html };
}

const paragraph = (words: string) => `<p style="margin:0 0 16px">${escapeHtml(words)}</p>`;

const entities: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
export const escapeHtml = (text: string) => text.replace(/[&<>"']/g, (mark) => entities[mark]!);

/** A line break in a subject would begin a header of the writer's choosing. */
const oneLine = (text: string) => text.replace(/\p{Cc}+/gu, ' ').trim();
