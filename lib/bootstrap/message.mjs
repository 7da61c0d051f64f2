const decoder = new TextDecoder('utf-8');

const decoded = (body, encoding) => {
  if (encoding === 'base64') return Buffer.from(body, 'base64');
  if (encoding !== 'quoted-printable') return Buffer.from(body, 'latin1');
  const joined = body.replace(/=\r?\n/g, '');
  return Buffer.from(
    joined.replace(/=([0-9A-F]{2})/gi, (_, hex) => String.fromCharCode(parseInt(hex, 16))),
    'latin1',
  );
};

/** Encoded words, by which letters outside of ASCII stand in a header (RFC 2047). */
const words = (text) =>
  text
    .replace(/(\?=)\s+(=\?)/g, '$1$2')
    .replace(/((?:=\?utf-8\?[bq]\?[^?]*\?=)+)/gi, (run) =>
      decoder.decode(
        Buffer.concat(
          [...run.matchAll(/=\?utf-8\?([bq])\?([^?]*)\?=/gi)].map(([, kind, body]) =>
            kind.toLowerCase() === 'b'
              ? decoded(body, 'base64')
              : decoded(body.replaceAll('_', ' '), 'quoted-printable'),
          ),
        ),
      ),
    );

function split(raw) {
  const end = /\r?\n\r?\n/.exec(raw);
  const head = end === null ? raw : raw.slice(0, end.index);
  const body = end === null ? '' : raw.slice(end.index + end[0].length);
  const headers = {};
  for (const line of head.replace(/\r?\n[ \t]+/g, ' ').split(/\r?\n/)) {
    const colon = line.indexOf(':');
    if (colon > 0) headers[line.slice(0, colon).toLowerCase()] = line.slice(colon + 1).trim();
  }
  return { headers, body };
}

/** The parts of a message that are text, by their type. */
function texts({ headers, body }, found = {}) {
  const type = headers['content-type'] ?? 'text/plain';
  const boundary = /boundary="?([^";]+)"?/i.exec(type)?.[1];
  if (boundary !== undefined) {
    for (const part of body.split(`--${boundary}`).slice(1, -1)) texts(split(part.replace(/^\r?\n/, '')), found);
    return found;
  }
  const kind = type.split(';')[0].trim().toLowerCase();
  const encoding = (headers['content-transfer-encoding'] ?? '').toLowerCase();
  found[kind] ??= decoder.decode(decoded(body, encoding)).replace(/\r\n/g, '\n').trimEnd();
  return found;
}

/** Reads a message as it came over SMTP: who, to whom, about what, and its text in both forms. */
export function readMessage(bytes) {
  const whole = split(bytes.toString('latin1'));
  const parts = texts(whole);
  const header = (name) => words(whole.headers[name] ?? '');
  return {
    date: header('date'),
    from: header('from'),
    to: header('to'),
    subject: header('subject'),
    text: parts['text/plain'] ?? '',
    html: parts['text/html'] ?? '',
  };
}
