// Writes docs/findings/ from the help text of each finding code, and docs/language.md from the declaration of the language. Run it with: npx tsx scripts/make-docs.mjs
import { mkdirSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { kinds } from '../src/findings/kinds.ts';
import { indexPage, pageName, pageOf } from '../src/findings/page.ts';
import { referencePage } from '../src/spec/reference-page.ts';

const folder = join(import.meta.dirname, '..', 'docs', 'findings');
const pages = new Map([['README.md', indexPage()], ...kinds.map((kind) => [pageName(kind), pageOf(kind)])]);

mkdirSync(folder, { recursive: true });
for (const name of readdirSync(folder)) if (!pages.has(name)) rmSync(join(folder, name));
for (const [name, text] of pages) writeFileSync(join(folder, name), text);
writeFileSync(join(folder, '..', 'language.md'), referencePage());
