import { existsSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const DOCS = ['README.md', 'DEVELOPERS.md'];

/**
 * Checks the documents of `repository`: every relative link leads to a file, every anchor to a heading, and every npm
 * command named is there. Addresses on the net are not followed.
 * @param {string} repository
 * @param {readonly string[]} [docs] paths from the repository
 * @returns {{ checked: number, faults: string[] }} how many links and commands were looked at, and one line per fault
 */
export function checkDocs(repository, docs = DOCS) {
  const { scripts = {} } = JSON.parse(readFileSync(join(repository, 'package.json'), 'utf8'));
  /** @type {string[]} */
  const faults = [];
  let checked = 0;
  for (const doc of docs) {
    const text = readFileSync(join(repository, doc), 'utf8');
    for (const link of linksOf(text)) {
      checked += 1;
      const fault = linkFault(repository, doc, link);
      if (fault !== null) faults.push(`${doc}: ${link}: ${fault}`);
    }
    for (const command of npmCommandsOf(text)) {
      checked += 1;
      if (!(command in scripts)) faults.push(`${doc}: package.json has no script "${command}"`);
    }
  }
  return { checked, faults };
}

/**
 * @param {string} repository
 * @param {string} doc
 * @param {string} link
 * @returns {string | null} what is wrong, or null
 */
function linkFault(repository, doc, link) {
  const [path = '', anchor] = link.split('#');
  const file = path === '' ? join(repository, doc) : join(repository, dirname(doc), decodeURIComponent(path));
  if (!existsSync(file)) return 'no such file';
  if (anchor === undefined || !file.endsWith('.md')) return null;
  return anchorsOf(readFileSync(file, 'utf8')).includes(anchor) ? null : 'no such heading';
}

/** @param {string} text */
const withoutFences = (text) => text.replaceAll(/^(```|~~~).*?^\1/gms, '');

/**
 * The targets of all links and pictures within the repository.
 * @param {string} text
 */
function linksOf(text) {
  const prose = withoutFences(text).replaceAll(/`[^`\n]*`/g, '');
  const inline = prose.matchAll(/\]\(\s*<?([^)\s>]+)>?(?:\s+"[^"]*")?\s*\)/g);
  const definitions = prose.matchAll(/^ {0,3}\[[^\]]+\]:\s*<?([^\s>]+)>?/gm);
  const markup = prose.matchAll(/\b(?:src|href)="([^"]+)"/g);
  return [...inline, ...definitions, ...markup]
    .map((match) => match[1] ?? '')
    .filter((target) => !/^[a-z][a-z+.-]*:/i.test(target));
}

/**
 * The anchors that a reader of Markdown makes of the headings: lower case, no punctuation, hyphens for blanks, numbered
 * when repeated.
 * @param {string} text
 */
function anchorsOf(text) {
  /** @type {Map<string, number>} */
  const seen = new Map();
  return [...withoutFences(text).matchAll(/^#{1,6}\s+(.+?)\s*#*$/gm)].map((match) => {
    const heading = (match[1] ?? '').replaceAll(/!?\[([^\]]*)\]\([^)]*\)/g, '$1');
    const slug = heading
      .toLowerCase()
      .replaceAll(/[^\p{L}\p{N}\p{M}_ -]/gu, '')
      .replaceAll(' ', '-');
    const times = seen.get(slug) ?? 0;
    seen.set(slug, times + 1);
    return times === 0 ? slug : `${slug}-${times}`;
  });
}

/**
 * The scripts that the commands in `text` call, fenced ones included.
 * @param {string} text
 */
function npmCommandsOf(text) {
  return [...text.matchAll(/\bnpm (?:run ([\w:-]+)|(test|start)\b)/g)].map(
    (match) => match[1] ?? match[2] ?? '',
  );
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const { checked, faults } = checkDocs(fileURLToPath(new URL('../..', import.meta.url)));
  for (const fault of faults) process.stdout.write(`${fault}\n`);
  process.stdout.write(`${checked} links and commands in ${DOCS.join(' and ')}, ${faults.length} faults\n`);
  if (faults.length > 0) process.exitCode = 1;
}
