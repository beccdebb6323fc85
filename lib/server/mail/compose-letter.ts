import 'server-only';

/** What a letter says, before it takes a form. */
export interface LetterParts {
  subject: string;
  /** Before the link. */
  before: readonly string[];
  /** The one thing to do; its address stands in the text form in full. */
  link: { words: string; href: string } | null;
  after: readonly string[];
  /** Who writes. */
  team: string;
}

/** A letter in both forms. */
export interface ComposedLetter {
  subject: string;
  text: string;
  html: string;
}

const ESCAPES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

function escaped(text: string): string {
  return text.replace(/[&<>"']/g, (sign) => ESCAPES[sign] ?? sign);
}

/** One line, whatever names were put in: a line break in a subject would begin another header. */
function oneLine(text: string): string {
  return text.replace(/[\u0000-\u001f\u007f]+/g, ' ').trim();
}

const FONT = 'font-family:Verdana,Arial,sans-serif;font-size:16px;line-height:1.5;color:#15171C';
const BUTTON =
  'display:inline-block;padding:10px 18px;background:#1B4B8F;color:#FFFFFF;font-weight:bold;text-decoration:none';

function paragraph(html: string): string {
  return `<p style="margin:0 0 16px">${html}</p>`;
}

function htmlOf({ subject, before, link, after, team }: LetterParts): string {
  const act = link
    ? [
        paragraph(`<a href="${escaped(link.href)}" style="${BUTTON}">${escaped(link.words)}</a>`),
        paragraph(`Or copy this address into a browser:<br>${escaped(link.href)}`),
      ]
    : [];
  const body = [
    ...before.map((words) => paragraph(escaped(words))),
    ...act,
    ...after.map((words) => paragraph(escaped(words))),
    paragraph(escaped(team)),
  ];
  return (
    `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>${escaped(subject)}</title></head>` +
    `<body style="margin:0;padding:24px;background:#FFFFFF"><div style="max-width:560px;${FONT}">${body.join('')}</div></body></html>`
  );
}

/** A letter as plain text and as HTML with the same words; nothing in it is fetched from anywhere. */
export function composeLetter(parts: LetterParts): ComposedLetter {
  const subject = oneLine(parts.subject);
  const { before, link, after, team } = parts;
  const act = link ? [`${link.words}:\n${link.href}`] : [];
  return {
    subject,
    text: `${[...before, ...act, ...after, team].join('\n\n')}\n`,
    html: htmlOf({ ...parts, subject }),
  };
}
