/** What the frequencies of every table must hold. */
import { formatFrequency } from '../../units/format';
import type { TableFault } from './spec-table';

const highestHz = 1e15;

/** The first fault of a column of frequencies, or null. `lines` gives the line of each. */
export function frequencyFault(
  frequenciesHz: readonly number[],
  lines: readonly number[],
  zero: 'zero allowed' | 'above zero',
): TableFault | null {
  for (const [index, hz] of frequenciesHz.entries()) {
    const line = lines[index] ?? null;
    if (hz < 0 || (hz === 0 && zero === 'above zero') || !(hz <= highestHz))
      return { fault: `${formatFrequency(hz)} is no frequency for this table`, line };
    const before = frequenciesHz[index - 1];
    if (before !== undefined && hz <= before) {
      return { fault: `${formatFrequency(hz)} follows ${formatFrequency(before)}: frequencies must rise from row to row`, line };
    }
  }
  return null;
}
