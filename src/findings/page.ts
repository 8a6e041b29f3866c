/** The documentation page of a finding code, and the index of all pages, made from the help texts. */
import { kindOf, kinds } from './kinds';
import type { Example, FindingKind, Group } from './kind';
import type { Severity } from './finding';

/** The page of one code as Markdown. */
export function pageOf({ code, severity, group, help }: FindingKind): string {
  const sections = [
    `# ${code}`,
    help.summary,
    `${severityWords[severity]} Chapter: ${group}.`,
    `## What it means\n\n${help.means}`,
    `## Why it matters\n\n${help.matters}`,
    `## How to cure it\n\n${help.cure}`,
    ...(help.example === null ? [] : [`## Example\n\n${exampleText(help.example)}`]),
  ];
  return `${sections.join('\n\n')}\n`;
}

/** The index of all pages as Markdown. */
export function indexPage(): string {
  const chapters = groups.map((group) => {
    const rows = kinds.filter((kind) => kind.group === group).map(indexRow);
    return `## ${group.charAt(0).toUpperCase()}${group.slice(1)}\n\n| code | severity | in one sentence |\n|---|---|---|\n${rows.join('\n')}`;
  });
  return `# Findings\n\n${introduction}\n\n${chapters.join('\n\n')}\n`;
}

/** The page of a code by its name, or null where there is no such code. */
export function explain(code: string): string | null {
  const kind = kindOf(code);
  return kind === null ? null : pageOf(kind);
}

/** The name of a code's page in the folder of pages. */
export function pageName(kind: Pick<FindingKind, 'code'>): string {
  return `${kind.code}.md`;
}

const groups: readonly Group[] = ['the text', 'sampling', 'copies', 'the wanted band', 'advice'];

const introduction = `One page for each finding. An error fails the check; a warning fails it only under \`--strict\`; a hint never does.
Findings about figures can be accepted where they stand, with a reason:
\`# bandkeep: accept CODE, reason\` on the line above or at the end of the line.`;

const severityWords: Readonly<Record<Severity, string>> = {
  error: 'An error: it fails the check.',
  warning: 'A warning: it fails the check only under `--strict`.',
  hint: 'A hint: it never fails the check.',
};

function indexRow(kind: FindingKind): string {
  return `| [\`${kind.code}\`](${pageName(kind)}) | ${kind.severity} | ${kind.help.summary} |`;
}

function exampleText({ spec, from, to }: Example): string {
  const change =
    to.trim() === '' ? `It is gone without${fenced(from)}` : `It is gone with${fenced(to)}\n\nin place of${fenced(from)}`;
  return `This spec has the finding:${fenced(spec)}\n\n${change}`;
}

function fenced(text: string): string {
  return `\n\n\`\`\`yaml\n${text.replace(/\n$/u, '')}\n\`\`\``;
}
