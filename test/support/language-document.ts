/** Judged documents for tests of editor features, with the cursor marked in the text by `¦`, and what is expected of them. */
import assert from 'node:assert/strict';
import { MarkupContent, type Hover, type Position } from 'vscode-languageserver-types';
import { drain } from '../../src/jobs';
import {
  diagnostics,
  hover,
  openSpec,
  unproved,
  type ClientAbilities,
  type LiveSpec,
  type SpecDocument,
} from '../../src/language';
import { findingLine, markerLines } from './markers';

/** An editor that can show everything. */
export const ableEditor: ClientAbilities = {
  relatedInformation: true,
  snippets: true,
  versionedEdits: true,
  snippetEdits: true,
  disabledActions: true,
  markdown: true,
};

/** An editor that can show nothing special. */
export const plainAbilities: ClientAbilities = {
  relatedInformation: false,
  snippets: false,
  versionedEdits: false,
  snippetEdits: false,
  disabledActions: false,
  markdown: false,
};

/** The sign for the cursor in a test's text. */
const cursorSign = '¦';

/** A judged document, and where the cursor is in it. */
export interface Opened {
  readonly spec: LiveSpec;
  readonly document: SpecDocument;
  readonly text: string;
  readonly cursor: Position;
}

/** Opens and judges a text; the cursor is at its mark, or at the start where there is none. */
export function opened(marked: string): Opened {
  const at = marked.indexOf(cursorSign);
  const text = marked.replace(cursorSign, '');
  const before = marked.slice(0, Math.max(at, 0)).split('\n');
  const spec = openSpec('file:///lagoon/gate.bandkeep.yaml', 1, text);
  const document = drain(spec.judging());
  return { spec, document, text, cursor: { line: before.length - 1, character: before.at(-1)?.length ?? 0 } };
}

/** The same, with the fixes of every finding searched for. */
export function openedAndProved(marked: string): Opened {
  const all = opened(marked);
  for (const finding of unproved(all.document)) drain(all.spec.curing(all.document, finding));
  return all;
}

/** The hover at the cursor, which must be there. */
export function hoverAt(marked: string, abilities = ableEditor): string {
  const { document, cursor } = opened(marked);
  return textOf(hover(document, cursor, abilities));
}

/** Checks the hover at the cursor: its bold line, and rows by their label. */
export function expectHover(
  marked: string,
  expected: { headline: string | RegExp; rows?: Record<string, string | RegExp> },
): void {
  const text = hoverAt(marked);
  matches(/^\*\*(.*?)\*\*$/mu.exec(text)?.[1] ?? '', expected.headline, text);
  const rows = new Map([...text.matchAll(/^\| (.*?) \| (.*) \|$/gmu)].map(([, label, value]) => [label, value]));
  for (const [label, value] of Object.entries(expected.rows ?? {})) {
    assert.ok(rows.has(label), `no row “${label}” in:\n${text}`);
    matches(rows.get(label) ?? '', value, text);
  }
}

/** Checks that the diagnostics of a text are those that its own caret comments ask for, at exactly their ranges. */
export function expectDiagnostics(text: string): void {
  const { document } = opened(text);
  const found = diagnostics(document, { abilities: ableEditor, docsBase: null }).map(({ code, range }) =>
    findingLine(text, { code: String(code), start: offsetIn(text, range.start), end: offsetIn(text, range.end) }),
  );
  assert.deepEqual(found.sort(), markerLines(text));
}

/** The offset of a position, counted by the test's own hand. */
export function offsetIn(text: string, { line, character }: Position): number {
  const lines = text.split('\n').slice(0, line);
  return lines.reduce((sum, each) => sum + each.length + 1, 0) + character;
}

function textOf(found: Hover | null): string {
  assert.ok(found, 'there is no hover');
  assert.ok(MarkupContent.is(found.contents));
  return found.contents.value;
}

function matches(actual: string, expected: string | RegExp, whole: string): void {
  if (typeof expected === 'string') assert.equal(actual, expected, whole);
  else assert.match(actual, expected, whole);
}
