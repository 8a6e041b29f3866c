/** Refuses texts that are too large to be specs. */
import type { Reading } from './reading';

/** 16 MiB, counted in UTF-16 units: a text of more has at least as many bytes. */
export const largestSpec = 16 * 1024 * 1024;

/** The reading of a text that is too large: one problem, at its first line. */
export function tooLarge(text: string): Reading {
  const lineFeed = text.indexOf('\n');
  const end = Math.min(lineFeed < 0 ? text.length : lineFeed, 80);
  const megabytes = (text.length / 1024 / 1024).toFixed(1);
  const message = `This text has ${megabytes} MiB, and a spec may have 16 MiB: divide it into several files.`;
  return {
    text,
    title: null,
    entries: [],
    names: [],
    problems: [{ code: 'too-large', severity: 'error', channel: null, span: { start: 0, end }, message, cures: [] }],
    acceptances: [],
    paths: [],
    counts: { slices: 0, slicesRead: 0, channelsResolved: 0 },
  };
}
