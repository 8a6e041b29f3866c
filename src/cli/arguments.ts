/** The command line taken apart. */
import { parseArgs } from 'node:util';
import { UsageError } from './usage';

/** What the command is asked to do. */
export type Command =
  | { readonly kind: 'help' }
  | { readonly kind: 'version' }
  | { readonly kind: 'explain'; readonly code: string }
  | { readonly kind: 'language-server'; readonly args: readonly string[] }
  | CheckCommand;

/** `bandkeep check`. */
export interface CheckCommand {
  readonly kind: 'check';
  readonly paths: readonly string[];
  /** What standard input is called in the result. */
  readonly name: string | null;
  readonly format: 'text' | 'json';
  readonly strict: boolean;
  readonly root: string | null;
  readonly fixes: boolean;
}

/**
 * Takes arguments apart.
 * @throws UsageError for anything that is not understood
 */
export function readArguments(args: readonly string[]): Command {
  const [verb, ...rest] = args;
  switch (verb) {
    case undefined:
      throw new UsageError('Say what to do, for example `bandkeep check`.');
    case '--help':
    case '-h':
    case 'help':
      return { kind: 'help' };
    case '--version':
      return { kind: 'version' };
    case 'check':
      return readCheck(rest);
    case 'explain':
      return readExplain(rest);
    case 'language-server':
      return { kind: 'language-server', args: rest };
    default:
      throw new UsageError(`There is no command \`${verb}\`.`);
  }
}

function readCheck(args: readonly string[]): Command {
  const { values, positionals } = parseCheck(args);
  if (values.help) return { kind: 'help' };
  const format = values.format ?? 'text';
  if (format !== 'text' && format !== 'json') {
    throw new UsageError(`The format \`${format}\` is not supported yet; use text or json.`);
  }
  const paths = positionals.length > 0 ? positionals : ['.'];
  if (paths.includes('-') && paths.length > 1) throw new UsageError('`-` (standard input) stands alone.');
  if (values.name !== undefined && !paths.includes('-')) throw new UsageError('`--name` goes with `-` (standard input).');
  return {
    kind: 'check',
    paths,
    name: values.name ?? null,
    format,
    strict: values.strict ?? false,
    root: values.root ?? null,
    fixes: !values['no-fixes'],
  };
}

function parseCheck(args: readonly string[]) {
  try {
    return parseArgs({
      args: [...args],
      allowPositionals: true,
      options: {
        format: { type: 'string' },
        strict: { type: 'boolean' },
        root: { type: 'string' },
        name: { type: 'string' },
        'no-fixes': { type: 'boolean' },
        help: { type: 'boolean', short: 'h' },
      },
    });
  } catch (fault) {
    throw new UsageError(fault instanceof Error ? fault.message : String(fault));
  }
}

function readExplain(args: readonly string[]): Command {
  const [code] = args;
  if (code === undefined || args.length !== 1)
    throw new UsageError('Name one finding code, for example `bandkeep explain alias-over-limit`.');
  return { kind: 'explain', code };
}
