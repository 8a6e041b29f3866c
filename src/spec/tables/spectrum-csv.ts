/** Reads a spectrum from CSV: frequency and level. */
import type { ColumnRole } from './csv';
import { readCsv } from './csv';
import { frequencyFault } from './frequencies';
import type { TableReading } from './spec-table';

const roles: readonly ColumnRole[] = [
  { called: 'a frequency', names: ['f', 'freq', 'frequency'], units: ['Hz'], example: 'frequency (Hz)' },
  {
    called: 'a level',
    names: ['level', 'amplitude', 'magnitude', 'power', 'voltage', 'spectrum'],
    units: ['dBFS', 'dBV', 'dBu', 'dBm', 'V', 'Vrms', 'Vpk', 'Vpp'],
    example: 'level (dBFS)',
  },
];

/** Reads a text; never throws. */
export function readSpectrumCsv(text: string): TableReading {
  const reading = readCsv(text, roles);
  if ('fault' in reading) return reading;
  const [frequency, level] = reading.csv.columns;
  if (!frequency || !level || level.unit === 'rad') {
    return {
      fault: `the header has no column of ${frequency ? 'level' : 'frequency'}: it reads like \`frequency (Hz), level (dBFS)\``,
      line: null,
    };
  }
  const { lines } = reading.csv;
  const fault = frequencyFault(frequency.values, lines, 'above zero');
  if (fault !== null) return fault;
  const volts = level.unit.startsWith('V');
  const odd = level.values.findIndex((value) => (volts ? !(value > 0) || value > 1e6 : Math.abs(value) > 400));
  if (odd >= 0)
    return {
      fault: volts ? 'the level is no voltage above zero' : 'the level is not between −400 and 400',
      line: lines[odd] ?? null,
    };
  return { table: { kind: 'spectrum', unit: level.unit, frequenciesHz: frequency.values, levels: level.values } };
}
