/** The example specs, as texts. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';

/** The text of `examples/NAME.bandkeep.yaml`. */
export function exampleText(name: string): string {
  return readFileSync(join(__dirname, '..', '..', 'examples', `${name}.bandkeep.yaml`), 'utf8').replaceAll('\r\n', '\n');
}
