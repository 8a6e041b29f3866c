/** Which specs a check reads, and their texts. */
import type { InputFile } from '../output';
import type { CheckCommand } from './arguments';
import type { Host } from './host';
import { UsageError } from './usage';

/** One spec, read. */
export interface InputText extends InputFile {
  readonly text: string;
  /** Its path from the root, where the paths that it names start; that of its name for standard input. */
  readonly fromRoot: string;
}

/**
 * Reads every spec that the command names, in the order of its paths, each file once.
 * @throws UsageError where a path leads nowhere, a folder holds no spec, or a file is not UTF-8
 */
export function readInputs(command: CheckCommand, host: Host): InputText[] {
  const root = rootOf(command, host);
  if (command.paths[0] === '-') {
    const name = command.name ?? 'standard-input.bandkeep.yaml';
    return [{ ...inputText(name, host.readInput(), host), fromRoot: host.relative(root, host.resolve(name)) }];
  }
  const files = new Set(command.paths.flatMap((path) => filesAt(path, host)));
  return [...files].map((file) => inputText(host.relative(root, file), readBytes(file, host), host));
}

/** The folder that paths in the result start from, and that no file may lead out of. */
export function rootOf(command: CheckCommand, host: Host): string {
  return host.resolve(command.root ?? '.');
}

function filesAt(path: string, host: Host): readonly string[] {
  const full = host.resolve(path);
  const kind = host.kindOf(full);
  if (kind === 'file') return [full];
  if (kind === null) throw new UsageError(`\`${path}\` is neither a file nor a folder that can be read.`);
  const specs = host.specsBelow(full);
  if (specs.length === 0) throw new UsageError(`There is no *.bandkeep.yaml below \`${path}\`.`);
  return specs;
}

function readBytes(file: string, host: Host): Uint8Array {
  try {
    return host.readFile(file);
  } catch (fault) {
    throw new UsageError(`\`${file}\` cannot be read: ${fault instanceof Error ? fault.message : String(fault)}`);
  }
}

function inputText(path: string, bytes: Uint8Array, host: Host): InputText {
  return { path, sha256: host.sha256(bytes), text: decoded(path, bytes), fromRoot: path };
}

/** UTF-8 without its byte order mark, which editors do not count as text either. */
function decoded(path: string, bytes: Uint8Array): string {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    throw new UsageError(`\`${path}\` is not UTF-8 text.`);
  }
}
