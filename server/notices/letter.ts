// The form of every mail: a subject, a few sentences, one link; as plain text and as simple HTML.
export interface Letter {
  readonly subject: string;
  readonly lines: readonly string[];
  readonly link?: { readonly label: string; readonly url: string };
  /** Small print: cautions, what is not known. */
  readonly foot?: string;
}

export interface RenderedMail {
  readonly subject: string;
  readonly text: string;
  readonly html: string;
}

const escape = (text: string): string =>
  text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;');

/** A name a stranger chose must not break the subject line. */
const oneLine = (text: string): string => text.replaceAll(/\s+/g, ' ').trim();

export function render(letter: Letter): RenderedMail {
  const subject = oneLine(letter.subject);
  const link = letter.link ? [`${letter.link.label}: ${letter.link.url}`] : [];
  const foot = letter.foot ? [`-- `, letter.foot] : [];
  const paragraphs = letter.lines.map((line) => `<p>${escape(line)}</p>`).join('');
  const button = letter.link
    ? `<p><a href="${escape(letter.link.url)}" style="font-weight:bold">${escape(letter.link.label)}</a></p>`
    : '';
  const small = letter.foot ? `<p style="font-size:13px">${escape(letter.foot)}</p>` : '';
  return {
    subject,
    text: [...letter.lines, ...link, ...foot].join('\n\n'),
    html: `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="color-scheme" content="light dark"><title>${escape(subject)}</title></head><body style="font-family:sans-serif;font-size:16px;line-height:1.5;max-width:36em"><h1 style="font-size:20px">${escape(subject)}</h1>${paragraphs}${button}${small}</body></html>`,
  };
}
