/** What a mail says, before it has its two parts. */
export interface Letter {
  readonly subject: string;
  readonly greeting: string;
  readonly paragraphs: readonly string[];
  /** The one thing to do. */
  readonly action?: { readonly label: string; readonly url: string };
  /** Smaller, below: why the mail came, what if it was not expected. */
  readonly closing: readonly string[];
}

/** A mail with its two parts, ready for a mail server. */
export interface Message {
  readonly subject: string;
  readonly text: string;
  readonly html: string;
}

const ENTITIES: Readonly<Record<string, string>> = {
  "&": "&amp;",
  "<": "&lt;",
  ">": "&gt;",
  '"': "&quot;",
  "'": "&#39;",
};

const escaped = (text: string) => text.replace(/[&<>"']/g, (character) => ENTITIES[character]);

/** No line break may enter a header, whatever a name contains. */
const oneLine = (text: string) => text.replace(/\s+/g, " ").trim();

const WIDTH = 72;

function wrapped(text: string): string {
  const lines: string[] = [];
  let line = "";
  for (const word of text.split(/\s+/)) {
    if (line !== "" && line.length + 1 + word.length > WIDTH) {
      lines.push(line);
      line = word;
    } else line = line === "" ? word : `${line} ${word}`;
  }
  return [...lines, line].join("\n");
}

/** Writes both parts of a letter: the same words, the HTML one without pictures or anything fetched. */
export function writeMessage(letter: Letter, origin: string): Message {
  const { subject, greeting, paragraphs, action, closing } = letter;
  const foot = `Rhoform at ${origin}`;
  const text = [
    greeting,
    ...paragraphs.map(wrapped),
    ...(action ? [`${action.label}:\n${action.url}`] : []),
    ...closing.map(wrapped),
    `-- \n${foot}`,
  ].join("\n\n");
  const p = (body: string, style = "") => `<p style="margin:0 0 16px;${style}">${body}</p>`;
  const soft = "font-size:13px;color:#566067";
  const html = [
    '<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width"><meta name="color-scheme" content="light">',
    `<title>${escaped(subject)}</title></head>`,
    '<body style="margin:0;padding:24px;background:#ffffff;color:#1b2226;font:16px/1.6 system-ui,sans-serif">',
    '<div style="max-width:544px;margin:0 auto">',
    p(escaped(greeting)),
    ...paragraphs.map((paragraph) => p(escaped(paragraph))),
    ...(action
      ? [
          p(
            `<a href="${escaped(action.url)}" style="display:inline-block;padding:8px 16px;border-radius:2px;background:#9c4a1f;color:#ffffff;text-decoration:none">${escaped(action.label)}</a>`,
          ),
          p(`Or open this address: <br>${escaped(action.url)}`, `${soft};word-break:break-all`),
        ]
      : []),
    ...closing.map((paragraph) => p(escaped(paragraph), soft)),
    `<hr style="border:0;border-top:1px solid #d9d3c6">${p(escaped(foot), soft)}`,
    "</div></body></html>",
  ].join("\n");
  return { subject: oneLine(subject), text: `${text}\n`, html };
}
