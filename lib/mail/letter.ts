import { escapeHtml, oneLine, wrap } from './text';

/** A message as it is sent: what stands in the list of messages, and its body in both forms. */
export interface Message {
  readonly subject: string;
  readonly text: string;
  readonly html: string;
}

/** What every message of Quadrel says. All of it is plain text; marks of HTML in it are letters like others. */
export interface Letter {
  readonly subject: string;
  readonly paragraphs: readonly string[];
  /** The one thing the reader can do. */
  readonly action: { readonly label: string; readonly link: string };
  /** What happens next, and what happens if the reader does nothing. */
  readonly afterwards: string;
  /** Why the reader gets this message. */
  readonly reason: string;
}

const serif = "Georgia,'Times New Roman',serif";
const sans = 'Arial,Helvetica,sans-serif';
const table = '<table role="presentation" cellpadding="0" cellspacing="0"';

const stone = (size: number, colour: string) =>
  `<td valign="bottom" style="font-size:0;line-height:0">${table}><tr><td width="${size}" height="${size}" style="background:${colour};font-size:0;line-height:0">&nbsp;</td></tr></table></td>`;

const mark = `${table}><tr>
      ${stone(20, '#1f1c18')}
      <td width="2" style="font-size:0;line-height:0">&nbsp;</td>
      ${stone(9, '#97371c')}
      <td valign="bottom" style="padding-left:10px;font:22px/20px ${serif};color:#1f1c18">Quadrel</td></tr></table>`;

const asHtml = ({ subject, paragraphs, action, afterwards, reason }: Letter): string => `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${escapeHtml(subject)}</title>
</head>
<body style="margin:0;padding:0;background:#c9ccc5">
<table role="presentation" width="100%" cellpadding="0" cellspacing="0" style="background:#c9ccc5"><tr><td align="center" style="padding:28px 14px">
  <table role="presentation" width="600" cellpadding="0" cellspacing="0" style="width:100%;max-width:600px">
    <tr><td style="padding:0 0 14px">${mark}</td></tr>
    <tr><td style="background:#fbf8f0;padding:34px 36px 36px;font:17px/1.55 ${serif};color:#1f1c18">
${paragraphs.map((words) => `      <p style="margin:0 0 18px">${escapeHtml(words)}</p>`).join('\n')}
      ${table} style="margin:26px 0 0"><tr><td style="background:#97371c"><a href="${escapeHtml(action.link)}" style="display:inline-block;padding:12px 20px;font:600 16px/1.2 ${sans};color:#fffaf3;text-decoration:none">${escapeHtml(action.label)}</a></td></tr></table>
      <p style="margin:22px 0 0;font-size:15px;color:#4d473e">${escapeHtml(afterwards)}</p>
    </td></tr>
    <tr><td style="padding:16px 2px 0;font:13px/1.55 ${sans};color:#4d473e">${escapeHtml(reason)}</td></tr>
  </table>
</td></tr></table>
</body>
</html>
`;

const asText = ({ paragraphs, action, afterwards, reason }: Letter): string =>
  `${[...paragraphs.map(wrap), `${action.label}:\n${action.link}`, wrap(afterwards)].join('\n\n')}\n\n-- \n${wrap(reason)}\n`;

/** Sets a letter in both forms. */
export function setLetter(letter: Letter): Message {
  // Programs that read mail would decode what a name writes as an encoded word, and show another name.
  const subject = oneLine(letter.subject, 200).replaceAll('=?', '= ?');
  return { subject, text: asText(letter), html: asHtml({ ...letter, subject }) };
}
