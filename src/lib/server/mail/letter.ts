/** What a mail says, before it is dressed: the same four parts as a page. */
export interface Letter {
  subject: string;
  /** name of whoever reads it, or empty */
  greeting: string;
  /** what it is about, in the plate: an order's number and title, or the shop's name */
  plate: { title: string; line: string };
  /** the sentence that says what has happened */
  sentence: string;
  /** further paragraphs */
  paragraphs: string[];
  action: { label: string; url: string } | null;
  /** a note in the margin, smaller */
  margin: string;
}

/** A mail ready for the queue. */
export interface Mail {
  kind: string;
  subject: string;
  text: string;
  html: string;
}

const escape = (words: string): string =>
  words.replace(/[&<>"']/g, (character) => `&#${character.charCodeAt(0)};`);

const FONT = "font-family:Manrope,'Segoe UI',Helvetica,Arial,sans-serif";
const paragraph = (words: string, style: string): string =>
  `<p style="margin:0 0 16px;${style}">${escape(words).replace(/\n/g, '<br>')}</p>`;

/** Long ticks every eighth: the rule under the plate, drawn with table cells that every mail reader keeps. */
function rule(): string {
  const cells = Array.from({ length: 24 }, (_, index) => {
    const height = index % 8 === 0 ? 10 : 5;
    return `<td width="23" style="border-left:1px solid #8b7d71;height:${height}px;font-size:0;line-height:0" height="${height}">&nbsp;</td>`;
  });
  return `<table role="presentation" cellpadding="0" cellspacing="0" width="100%" style="border-top:1px solid #8b7d71"><tr valign="top">${cells.join('')}</tr></table>`;
}

function html(letter: Letter): string {
  const ink = `${FONT};font-size:16px;line-height:1.5;color:#342117`;
  const quiet = `${FONT};font-size:13px;line-height:1.5;color:#655043`;
  const button = letter.action
    ? `<p style="margin:8px 0 24px"><a href="${escape(letter.action.url)}" style="${FONT};display:inline-block;padding:11px 20px;border-radius:2px;background:#006479;color:#fefcf9;font-size:16px;font-weight:600;text-decoration:none">${escape(letter.action.label)}</a></p>${paragraph(letter.action.url, `${quiet};word-break:break-all`)}`
    : '';
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><meta name="color-scheme" content="light"><title>${escape(letter.subject)}</title></head>
<body style="margin:0;padding:24px 16px;background:#f9f5ee"><table role="presentation" align="center" cellpadding="0" cellspacing="0" width="100%" style="max-width:560px;background:#fefcf9"><tr><td style="padding:32px 24px 20px;background:#8e8e8e;color:#1c1611;${FONT}"><div style="font-size:25px;line-height:1.2;font-weight:700;color:#000000">${escape(letter.plate.title)}</div><div style="font-size:15px;line-height:1.5;color:#000000">${escape(letter.plate.line)}</div></td></tr><tr><td>${rule()}</td></tr><tr><td style="padding:24px">${letter.greeting ? paragraph(`${letter.greeting},`, ink) : ''}${paragraph(letter.sentence, `${ink};font-weight:600`)}${letter.paragraphs.map((words) => paragraph(words, ink)).join('')}${button}<div style="border-left:1px solid #8b7d71;padding-left:16px">${paragraph(letter.margin, `${quiet};margin:0`)}</div></td></tr></table></body></html>`;
}

function text(letter: Letter): string {
  const parts = [
    `${letter.plate.title}\n${letter.plate.line}\n${'-'.repeat(48)}`,
    letter.greeting && `${letter.greeting},`,
    letter.sentence,
    ...letter.paragraphs,
    letter.action && `${letter.action.label}:\n${letter.action.url}`,
    letter.margin,
  ];
  return `${parts.filter(Boolean).join('\n\n')}\n`;
}

/** Dresses a letter as HTML and as plain text that says the same. */
export function dress(kind: string, letter: Letter): Mail {
  return { kind, subject: letter.subject.replace(/[\r\n]+/g, ' '), html: html(letter), text: text(letter) };
}
