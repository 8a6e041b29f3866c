/** Reads a measured response from CSV: frequency, gain and, if present, phase. */
import type { ColumnRole } from './csv';
import { readCsv } from './csv';
import { frequencyFault } from './frequencies';
import { unwrapped } from './response-of';
import type { TableReading } from './spec-table';

const roles: readonly ColumnRole[] = [
  { called: 'a frequency', names: ['f', 'freq', 'frequency'], units: ['Hz'], example: 'frequency (Hz)' },
  {
    called: 'a gain',
    names: ['gain', 'magnitude', 'mag', 'amplitude', 's21', '|s21|', 'response', 'level'],
    units: ['dB', 'V/V'],
    example: 'gain (dB)',
  },
  { called: 'a phase', names: ['phase', 'angle', 'arg'], units: ['deg', 'rad'], example: 'phase (deg)' },
];

/** Reads a text; never throws. */
export function readResponseCsv(text: string): TableReading {
  const reading = readCsv(text, roles);
  if ('fault' in reading) return reading;
  const [frequency, gain, phase] = reading.csv.columns;
  if (!frequency || !gain) {
    return {
      fault: `the header has no column of ${frequency ? 'gain' : 'frequency'}: it reads like \`frequency (Hz), gain (dB)\``,
      line: null,
    };
  }
  const { lines } = reading.csv;
  const fault = frequencyFault(frequency.values, lines, 'zero allowed');
  if (fault !== null) return fault;
  if (lines.length < 2) return { fault: 'one row is no response: at least two are needed', line: null };
  const gainsDb = gain.unit === 'dB' ? gain.values : gain.values.map((value) => 20 * Math.log10(value));
  const odd = gainsDb.findIndex((value) => !Number.isFinite(value) || Math.abs(value) > mostDb);
  if (odd >= 0) return { fault: 'the gain is no ratio between −400 dB and 400 dB', line: lines[odd] ?? null };
  const perTurn = phase?.unit === 'rad' ? 1 : Math.PI / 180;
  const phasesRad = phase ? unwrapped(phase.values.map((value) => value * perTurn)) : null;
  return { table: { kind: 'response', table: { frequenciesHz: frequency.values, gainsDb, phasesRad } } };
}

const mostDb = 400;
