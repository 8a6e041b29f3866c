/** What an export becomes as a file: a harmless name, and bytes. */
import type { PageMessage, SaveKind } from '../../protocol/panel-messages';

/** The page's message that carries an export. */
export type SaveMessage = Extract<PageMessage, { kind: 'save' }>;

/** How a save dialog names each kind, and its ending. */
export const exportFilters: Record<SaveKind, Record<string, string[]>> = {
  png: { 'PNG picture': ['png'] },
  svg: { 'SVG picture': ['svg'] },
  csv: { 'CSV table': ['csv'] },
};

/** The proposed name without anything that could lead into another folder, with the right ending. */
export function exportName({ name, format }: Pick<SaveMessage, 'name' | 'format'>): string {
  const ending = `.${format}`;
  const stem = name.endsWith(ending) ? name.slice(0, -ending.length) : name;
  const plain = stem.replace(/[^\p{L}\p{N} ._-]+/gu, '-').replace(/^[.\s-]+/, '');
  return `${plain === '' ? 'bandkeep' : plain}${ending}`;
}

/** The content as it goes into the file. */
export function exportBytes({ format, data }: Pick<SaveMessage, 'format' | 'data'>): Uint8Array {
  if (format !== 'png') return new TextEncoder().encode(data);
  return Uint8Array.from(atob(data), (character) => character.charCodeAt(0));
}
