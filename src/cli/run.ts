/** The command: arguments in, exit code out; everything it touches comes from the host. */
import { explain } from '../findings';
import { checkText } from '../jobs';
import { ansi, plain, tally, toResult, toText, type CheckedFile, type InputFile } from '../output';
import { readArguments, type CheckCommand } from './arguments';
import { exitCode, type Host } from './host';
import { readInputs, rootOf, type InputText } from './inputs';
import { NamedFiles } from './named-files';
import { usage, UsageError } from './usage';

/** Runs the command and gives its exit code; never throws. */
export async function run(host: Host): Promise<number> {
  try {
    return await runCommand(host);
  } catch (fault) {
    if (fault instanceof UsageError) {
      host.writeError(`bandkeep: ${fault.message}\nTry \`bandkeep --help\`.\n`);
      return exitCode.usage;
    }
    const detail = fault instanceof Error ? (fault.stack ?? fault.message) : String(fault);
    host.writeError(`bandkeep ${host.version}: a fault of the program itself. Please report it with this text:\n${detail}\n`);
    return exitCode.internal;
  }
}

async function runCommand(host: Host): Promise<number> {
  const command = readArguments(host.args);
  switch (command.kind) {
    case 'help':
      host.write(usage);
      return exitCode.holds;
    case 'version':
      host.write(`${host.version}\n`);
      return exitCode.holds;
    case 'explain':
      return explainCode(command.code, host);
    case 'language-server':
      return host.serveLanguage(command.args);
    case 'check':
      return check(command, host);
  }
}

function check(command: CheckCommand, host: Host): number {
  const inputs = readInputs(command, host);
  const named = new NamedFiles(host, rootOf(command, host));
  const files = inputs.map(({ path, text, fromRoot }) =>
    checkText(path, text, { fixes: command.fixes, files: named.sourceFor(fromRoot) }),
  );
  host.write(
    command.format === 'json' ? asJson(files, allRead(inputs, named), host) : toText(files, inColour(host) ? ansi : plain),
  );
  const { errors, warnings } = tally(files);
  return errors > 0 || (command.strict && warnings > 0) ? exitCode.findings : exitCode.holds;
}

/** The specs in their order, then every other file that they name. */
function allRead(inputs: readonly InputText[], named: NamedFiles): readonly InputFile[] {
  const checked = new Set(inputs.map(({ path }) => path));
  return [...inputs, ...named.inputs.filter(({ path }) => !checked.has(path))];
}

function asJson(files: readonly CheckedFile[], inputs: readonly InputFile[], host: Host): string {
  return `${JSON.stringify(toResult(files, inputs, host.version), null, 2)}\n`;
}

/** Colour only on a terminal that can show it, and never against NO_COLOR. */
function inColour(host: Host): boolean {
  return host.isTerminal && !host.env['NO_COLOR'] && host.env['TERM'] !== 'dumb';
}

function explainCode(code: string, host: Host): number {
  const page = explain(code);
  if (page === null) throw new UsageError(`There is no finding \`${code}\`.`);
  host.write(page);
  return exitCode.holds;
}
