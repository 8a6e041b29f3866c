/** The rules of Touchstone files: option line, units, formats, order of parameters, comments, case, and what S21 is. */
import assert from 'node:assert/strict';
import { loadedResponse } from '../../../src/spec/tables/loaded-response';
import type { Network } from '../../../src/spec/tables/spec-table';
import { readTouchstone } from '../../../src/spec/tables/touchstone';
import { roundingDb, roundingRelative } from '../../support/tolerance';
import type { OutsideGroup } from '../group';

function networkOf(text: string): Network {
  const reading = readTouchstone(text);
  assert.ok('table' in reading && reading.table.kind === 'network', 'fault' in reading ? reading.fault : text);
  return reading.table.network;
}

/** Two points whose four parameters are 0.1, 0.5, 0.2 and 0.4 in the order they stand in. */
const plain = '1 0.1 0 0.5 90 0.2 180 0.4 0\n2 0.1 0 0.5 90 0.2 180 0.4 0\n';
const second = (order: string): string =>
  `[Version] 2.0\n# MHz S MA R 50\n[Number of Ports] 2\n[Two-Port Data Order] ${order}\n[Network Data]\n${plain}[End]\n`;

/** The group. */
export const touchstone: OutsideGroup = {
  title: 'Rules of Touchstone files',
  source: 'EIA/IBIS open specification in two public copies; the order keywords of version 2 from memory of it',
  define: (tally) => {
    it('take GHz, S, MA in degrees and 50 Ω where the option line says nothing, or where it says only a part', () => {
      for (const [line, hz, ohm] of [
        ['', 1e9, 50],
        ['#\n', 1e9, 50],
        ['# R 75\n', 1e9, 75],
        ['# MHz\n', 1e6, 50],
        ['# S MA\n', 1e9, 50],
      ] as const) {
        const { frequenciesHz, referenceOhm, s21 } = networkOf(line + plain);
        tally.exact([frequenciesHz[0], referenceOhm], [hz, ohm], line);
        tally.absolute(s21[0]?.im ?? NaN, 0.5, roundingRelative, `${line}, 90 degrees`);
      }
    });

    it('know four units, in any case', () => {
      for (const [unit, hz] of Object.entries({ Hz: 1, kHz: 1e3, MHZ: 1e6, ghz: 1e9 }))
        tally.exact(networkOf(`# ${unit} s ma r 50\n${plain}`).frequenciesHz[0], hz, unit);
    });

    it('know three formats: magnitude and angle, 20·log10 of it and angle, real and imaginary', () => {
      for (const [format, first, other] of [
        ['MA', '0.5', '90'],
        ['DB', '-6.020599913279624', '90'],
        ['RI', '0', '0.5'],
      ] as const) {
        const { s21 } = networkOf(`# MHz S ${format} R 50\n1 0 0 ${first} ${other} 0 0 0 0\n2 0 0 ${first} ${other} 0 0 0 0\n`);
        tally.absolute(s21[0]?.re ?? NaN, 0, roundingRelative, format);
        tally.absolute(s21[0]?.im ?? NaN, 0.5, roundingRelative, format);
      }
    });

    it('hold S11 S21 S12 S22 in that order in version 1, which version 2 calls 21_12; 12_21 is S11 S12 S21 S22', () => {
      for (const text of [plain, second('21_12')]) {
        const { s11, s21, s12, s22 } = networkOf(text);
        const sizes = [s11, s21, s12, s22].map(([one]) => Math.hypot(one?.re ?? NaN, one?.im ?? NaN));
        [0.1, 0.5, 0.2, 0.4].forEach((expected, index) => {
          tally.absolute(sizes[index] ?? NaN, expected, roundingRelative, text);
        });
      }
      const { s21, s12 } = networkOf(second('12_21'));
      tally.absolute(s12[0]?.im ?? NaN, 0.5, roundingRelative, 'second pair of 12_21');
      tally.absolute(s21[0]?.re ?? NaN, -0.2, roundingRelative, 'third pair of 12_21');
    });

    it('begin comments with ! anywhere on a line, count the first option line only, and may break a record', () => {
      const text = `! probe\n# MHz S MA R 50 ! options\n# GHz S DB R 75\n1 0.1 0 0.5 90 ! half\n 0.2 180 0.4 0\n! between\n2 0.1 0 0.5 90 0.2 180 0.4 0\n`;
      const { frequenciesHz, referenceOhm, s22 } = networkOf(text);
      tally.exact([frequenciesHz, referenceOhm], [[1e6, 2e6], 50], 'comments');
      tally.absolute(s22[0]?.re ?? NaN, 0.4, roundingRelative, 'the record over two lines');
    });

    it('give in S21 a transducer gain: between matched resistances the load has 6.02 dB less of the source’s voltage', () => {
      const through = networkOf('# MHz S MA R 50\n1 0 0 1 0 1 0 0 0\n2 0 0 1 0 1 0 0 0\n');
      const levelDb = (loads: { sourceOhm: number; loadOhm: number } | null): number => {
        const response = loadedResponse(through, loads);
        assert.ok('table' in response);
        return response.table.gainsDb[0] ?? NaN;
      };
      tally.decibels(levelDb(null), 0, roundingDb, 'S21');
      tally.decibels(levelDb({ sourceOhm: 50, loadOhm: 50 }), -20 * Math.log10(2), roundingDb, 'matched');
      // Without anything between, a divider.
      tally.decibels(levelDb({ sourceOhm: 600, loadOhm: 200 }), 20 * Math.log10(0.25), roundingDb, '600 Ω into 200 Ω');
    });
  },
};
