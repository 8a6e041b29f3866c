/** The machine-readable result of a check. */
import type { Range } from '../protocol/position';
import { lineIndexOf, spanOf, type Span } from '../spec';
import { channelResult } from './channel-result';
import type { CheckedFile, InputFile } from './checked-file';
import { findingResult } from './finding-result';
import type { FileResult, ResultFile } from './result-file';

/**
 * The whole result, files in the order given.
 * @param inputs every file that was read, tables included
 * @param tool the version of the program
 */
export function toResult(files: readonly CheckedFile[], inputs: readonly InputFile[], tool: string): ResultFile {
  return {
    bandkeep: 1,
    tool,
    inputs: inputs.map(({ path, sha256 }) => ({ path, sha256 })),
    files: files.map(fileResult),
  };
}

function fileResult(file: CheckedFile): FileResult {
  const { reading, findings, channels } = file.judgement;
  const lines = lineIndexOf(reading);
  const rangeOf = (span: Span): Range => ({ start: lines.positionAt(span.start), end: lines.positionAt(span.end) });
  return {
    path: file.path,
    findings: findings.map((finding) => findingResult(file, finding, rangeOf)),
    channels: channels.map((channel) =>
      channelResult(channel, (path) => rangeOf(spanOf(reading, { channel: channel.entry.name, path }))),
    ),
  };
}
