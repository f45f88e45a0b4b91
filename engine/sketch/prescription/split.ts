/** One line of a pasted table: its number in the text, counted from 1, and its cells without the blanks around them. */
export interface Line {
  readonly number: number;
  readonly cells: readonly string[];
}

/** The lines of a pasted table that hold anything, in cells. What parts the cells is found out from the text as a whole. */
export function splitTable(text: string): readonly Line[] {
  const lines = text
    .split(/\r\n|\r|\n/)
    .map((line, at) => ({ number: at + 1, text: line }))
    .filter((line) => line.text.trim() !== '');
  const split = splitterOf(lines.map((line) => line.text.trim()));
  return lines.map((line) => ({ number: line.number, cells: split(line.text).map((cell) => cell.trim()) }));
}

type Split = (line: string) => readonly string[];

/** A line that begins like a surface: with a number, a plane, or the number of the surface. */
const DATA = /^["']?([-+\u2212\u2013]?[.,]?\d|[-+\u2212]?∞|inf|flat|plan)/i;

/**
 * Tab before semicolon before blanks and commas. A comma between digits is a decimal comma where something else parts the cells:
 * a tab, a semicolon, blanks, or a comma with a blank behind it in a table that has no decimal points.
 */
function splitterOf(lines: readonly string[]): Split {
  if (lines.some((line) => line.includes('\t'))) return quoted('\t');
  if (lines.some((line) => line.includes(';'))) return quoted(';');
  const data = lines.filter((line) => DATA.test(line)).map((line) => line.replaceAll(/\s+,/g, ','));
  const some = data.length > 0 ? data : lines;
  const hasComma = some.some((line) => line.includes(','));
  if (!hasComma || some.some((line) => /[^,\s]\s+\S/.test(line))) return blanks(some);
  const decimalComma = some.some((line) => /\d,\d/.test(line)) && some.some((line) => /,\s/.test(line));
  const hasPoint = some.some((line) => /\d\.\d/.test(line));
  return decimalComma && !hasPoint ? (line) => line.trim().split(/,\s+|,$/) : quoted(',');
}

/** Where columns are set apart by two blanks and more, a single one belongs to a cell, as in `clear diameter`. */
function blanks(data: readonly string[]): Split {
  const one: Split = (line) => line.trim().split(/\s+/);
  const two: Split = (line) => line.trim().split(/\s{2,}/);
  return data.every((line) => one(line).length === two(line).length) ? two : one;
}

/** Cells parted by one character, which may stand inside a cell in double quotes. */
const quoted =
  (separator: string): Split =>
  (line) => {
    const cells: string[] = [];
    let cell = '';
    let inside = false;
    for (const character of line) {
      if (character === '"') inside = !inside;
      else if (character === separator && !inside) {
        cells.push(cell);
        cell = '';
      } else cell += character;
    }
    return [...cells, cell];
  };
