/** Hover of a level: the same level in every unit that the channel knows enough for. */
import type { Channel, Path } from '../../spec';
import { formatDb, formatVoltage } from '../../units/format';
import { knownRows, type Answer, type Row } from './answer';
import { indexIn, type Subject } from './subject';

/** A sine's peak-to-peak value over its rms value. */
const peakToPeakOverRms = 2 * Math.SQRT2;
/** The reference of dBm. */
const milliwatt = 1e-3;

/** The level at the subject's path, or null where none stands there. */
export function levelHover({ channel, path }: Subject): Answer | null {
  const levelDb = levelAt(channel, path);
  if (levelDb === null) return null;
  return {
    headline: formatDb(levelDb, 'dBFS'),
    rows: levelRows(channel, levelDb),
    formula: '0 dBFS is the sine whose peaks just reach full scale',
  };
}

/** A level in dBFS in all other units that are known. */
export function levelRows({ fullScaleVpp, impedanceOhm, bits }: Channel, levelDb: number): Row[] {
  const ratio = 10 ** (levelDb / 20);
  const rms = fullScaleVpp === null ? null : (fullScaleVpp * ratio) / peakToPeakOverRms;
  return knownRows(
    ['rms', rms === null ? null : formatVoltage(rms)],
    ['peak to peak', rms === null ? null : formatVoltage(rms * peakToPeakOverRms)],
    ['dBm', rms === null || impedanceOhm === null ? null : formatDb(10 * Math.log10(rms ** 2 / impedanceOhm / milliwatt), 'dBm')],
    ['steps, peak to peak', bits === null ? null : stepsWords(2 ** bits * ratio)],
  );
}

/** A number of steps: whole where it is large, else with four digits. */
function stepsWords(steps: number): string {
  return steps >= 1000 ? String(Math.round(steps)) : String(Number(steps.toPrecision(4)));
}

function levelAt(channel: Channel, path: Path): number | null {
  switch (path[0]) {
    case 'wanted':
      return channel.wanted[indexIn(path)]?.levelDb ?? null;
    case 'unwanted':
      return channel.unwanted[indexIn(path)]?.levelDb ?? null;
    case 'test-tone':
      return channel.testTone.levelDb;
    default:
      return null;
  }
}
