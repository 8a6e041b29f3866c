/** The command's help, and the fault that sends a reader there. */

/** A call that cannot be carried out as it was written. */
export class UsageError extends Error {}

/** What `bandkeep --help` prints. */
export const usage = `Judges the analogue edge of sampled systems, described in *.bandkeep.yaml files.

  bandkeep check [PATH …]          check files, or every spec in folders (default: this folder)
  bandkeep check - --name FILE     check standard input, called FILE in the result
  bandkeep explain CODE            what a finding means and how to cure it
  bandkeep language-server --stdio start the language server for an editor

Options of check
  --format text|json   text for people (default), json for programs
  --strict             warnings fail the check too
  --root FOLDER        paths in the result are relative to it, and every file that a spec
                       names lies in it (default: this folder)
  --no-fixes           do not search for fixes (faster on large sets)
  --help, --version

Exit codes: 0 all limits hold, 1 a limit is broken or a text has faults, 2 the call or an input
cannot be used, 3 a fault of the program itself.

A design aid: verify on hardware; local codes and licensed practice come first.
`;
