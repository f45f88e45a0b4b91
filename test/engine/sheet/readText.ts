/** The records of a delimited text after the grammar of RFC 4180. Throws where the text breaks it. */
export function readRecords(text: string, separator: string): string[][] {
  const records: string[][] = [];
  let at = 0;
  while (at < text.length) {
    const record: string[] = [];
    for (;;) {
      const [field, end] = text[at] === '"' ? quotedField(text, at) : plainField(text, at, separator);
      record.push(field);
      at = end;
      if (text[at] !== separator) break;
      at++;
    }
    if (!text.startsWith('\r\n', at))
      throw new Error(`no line break behind field ${record.length}, at ${at}`);
    at += 2;
    records.push(record);
  }
  return records;
}

function quotedField(text: string, start: number): [string, number] {
  let field = '';
  let at = start + 1;
  for (;;) {
    if (at >= text.length) throw new Error('a quote is not closed');
    if (text[at] !== '"') field += text[at++];
    else if (text[at + 1] === '"') {
      field += '"';
      at += 2;
    } else return [field, at + 1];
  }
}

function plainField(text: string, start: number, separator: string): [string, number] {
  let at = start;
  while (at < text.length && text[at] !== separator && text[at] !== '\r') {
    if (text[at] === '"' || text[at] === '\n') throw new Error(`a bare ${JSON.stringify(text[at])} at ${at}`);
    at++;
  }
  return [text.slice(start, at), at];
}

/** The tables of a Markdown text: their rows of cells, the rule under the headings left out, escapes undone. */
export function readMarkdownTables(text: string): string[][][] {
  const tables: string[][][] = [];
  let table: string[][] | null = null;
  for (const line of text.split('\n')) {
    if (!line.startsWith('| ')) {
      table = null;
      continue;
    }
    if (table === null) {
      table = [];
      tables.push(table);
    }
    const cells = line.slice(2, -2).split(/(?<=(?:^|[^\\])(?:\\\\)*) \| /);
    if (!cells.every((cell) => /^-+:?$/.test(cell)))
      table.push(cells.map((cell) => cell.replace(/\\(.)/g, '$1')));
  }
  return tables;
}
