/** A line that holds cells, with its number in the file, 1-based. */
export type ContentLine = { line: number; text: string };

export type ContentLines = {
  content: ContentLine[];
  /** Without blank ones; `text` without the comment sign. */
  comments: ContentLine[];
};

/** Signs that begin a comment; a quotation mark before is left by spreadsheets. */
const comment = /^\s*"?(?:[#%!]+|\/\/)\s?(.*)$/s;
/** `;` begins a comment too, unless what follows are numbers: then it is an empty first cell. */
const semicolonComment = /^\s*;(?![\s\d;.,eE+-]*$)\s?(.*)$/s;

/** Takes a text apart at LF, CRLF or CR; blank lines are left out. */
export function contentLines(text: string): ContentLines {
  const content: ContentLine[] = [];
  const comments: ContentLine[] = [];
  text.split(/\r\n|\n|\r/).forEach((one, position) => {
    if (!/\S/.test(one)) return;
    const line = position + 1;
    const found = comment.exec(one) ?? semicolonComment.exec(one);
    if (!found) content.push({ line, text: one });
    else if (/\S/.test(found[1]!)) comments.push({ line, text: found[1]! });
  });
  return { content, comments };
}
