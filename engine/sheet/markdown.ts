import type { Block, SpacingTable } from './table.ts';
import { cellText, headingOf } from './table.ts';

/**
 * The table in Markdown: a heading, a table of positions, a table of elements, the notes as a list. Numbers stand to the
 * right. Characters that Markdown would read as marks, the pipe among them, are escaped; line breaks become blanks.
 */
export function markdownText(table: SpacingTable): string {
  const sections = [
    `# Spacing table: ${escapeText(table.title)}`,
    blockText(table.positions),
    blockText(table.elements),
    table.notes.map((note) => `- ${escapeText(note)}`).join('\n'),
  ];
  return `${sections.join('\n\n')}\n`;
}

function blockText(block: Block<string>): string {
  const rule = block.columns.map((column) => (column.kind === 'name' ? '---' : '---:'));
  const rows = block.rows.map((row) =>
    row.cells.map((cell) => (cell.kind === 'number' ? cellText(cell) : escapeText(cellText(cell)))),
  );
  const headings = block.columns.map((column) => escapeText(headingOf(column)));
  return [headings, rule, ...rows].map((cells) => `| ${cells.join(' | ')} |`).join('\n');
}

const escapeText = (text: string): string =>
  text.replace(/[\r\n]+/g, ' ').replace(/[\\|`*_<>[\]#~&]/g, (mark) => `\\${mark}`);
