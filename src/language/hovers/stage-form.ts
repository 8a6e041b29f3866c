/** What a stage is made of: its sections by f₀ and Q, its zeros, its parts, or the table it was measured as. */
import type { StagePath } from '../../analysis';
import type { MeasuredForm, Stage, StagePart } from '../../spec';
import { formatCount, formatFrequency, formatPrefixed, formatSignedPercent, plainNumber } from '../../units/format';
import { knownRows, type Row } from './answer';
import { bandWords } from './words';

/** The rows of one stage. */
export function formRows({ stage, filter }: StagePath): Row[] {
  if (stage.form.kind === 'measured') return tableRows(stage.form);
  const found: Filter | null = filter;
  if (found === null) return [];
  const poles = found.poles.filter(({ im }) => im >= 0).map(sectionRow);
  return [...partRows(stage), ...poles, ...zeroRows(found.zeros.filter(({ im }) => im >= 0))];
}

type Filter = Pick<NonNullable<StagePath['filter']>, 'poles' | 'zeros'>;
type Root = Filter['poles'][number];

function sectionRow(pole: Root, index: number): Row {
  const label = `section ${index + 1}`;
  if (pole.im === 0) return [label, `${formatFrequency(Math.abs(pole.re))}, one real pole`];
  return [label, resonanceWords(pole)];
}

function resonanceWords({ re, im }: Root): string {
  const frequencyHz = Math.hypot(re, im);
  return `f₀ ${formatFrequency(frequencyHz)}, Q ${digits(frequencyHz / (2 * Math.abs(re)))}`;
}

/** Zeros at 0 Hz are counted; those on the axis are nulls; the others have an f₀ and a Q. */
function zeroRows(zeros: readonly Root[]): Row[] {
  const atZero = zeros.filter(({ re, im }) => re === 0 && im === 0).length;
  const nulls = zeros.filter(({ re, im }) => re === 0 && im > 0).map(({ im }) => formatFrequency(im));
  const others = zeros.filter(({ re }) => re !== 0);
  return [
    ...knownRows(
      ['zeros at 0 Hz', atZero === 0 ? null : String(atZero)],
      ['nulls at', nulls.length === 0 ? null : [...new Set(nulls)].join(', ')],
    ),
    ...others.map((zero, index): Row => [others.length === 1 ? 'zero' : `zero ${index + 1}`, zeroWords(zero)]),
  ];
}

function zeroWords(zero: Root): string {
  const side = zero.re > 0 ? ', right of the axis' : '';
  return `${zero.im === 0 ? `${formatFrequency(Math.abs(zero.re))}, real` : resonanceWords(zero)}${side}`;
}

const partUnits: Readonly<Record<StagePart['part'], string>> = { r: 'Ω', l: 'H', c: 'F' };

function partRows({ form, parts, cornerTolerance }: Stage): Row[] {
  const { low, high } = cornerTolerance;
  const drift = low === 0 && high === 0 ? null : `${formatSignedPercent(low)} … ${formatSignedPercent(high)}`;
  return [
    ...parts.map(({ part, value, tolerance }): Row => [part.toUpperCase(), partWords(part, value, tolerance)]),
    ...knownRows(['corner of the parts', cornerOf(form)], ['the corner may be off by', drift]),
  ];
}

function partWords(part: StagePart['part'], value: number, { low, high }: StagePart['tolerance']): string {
  const off = low === 0 && high === 0 ? '' : `, ${formatSignedPercent(low)} … ${formatSignedPercent(high)}`;
  return `${formatPrefixed(value, partUnits[part], 4)}${off}`;
}

/** 1/(2πRC), or 1/(2π√(LC)) and √(L/C)/R; null where no parts are given. */
function cornerOf(form: Stage['form']): string | null {
  if (form.kind === 'rc' || form.kind === 'cr') return formatFrequency(1 / (2 * Math.PI * form.ohm * form.farad));
  if (form.kind !== 'rlc') return null;
  const q = Math.sqrt(form.henry / form.farad) / form.ohm;
  return `f₀ ${formatFrequency(1 / (2 * Math.PI * Math.sqrt(form.henry * form.farad)))}, Q ${digits(q)}`;
}

function tableRows({ path, table, below, beyond }: MeasuredForm): Row[] {
  const { frequenciesHz, phasesRad } = table;
  return [
    ['measured in', `\`${path}\`, ${formatCount(frequenciesHz.length, 'row')}`],
    ['the table covers', bandWords(frequenciesHz[0] ?? 0, frequenciesHz.at(-1) ?? 0)],
    ['phase', phasesRad === null ? 'not in the table: delay is not known' : 'in the table'],
    ['below it', below === 'hold' ? 'its first value holds' : 'nothing can be judged'],
    ['beyond it', beyondWords(beyond)],
  ];
}

function beyondWords(beyond: MeasuredForm['beyond']): string {
  if (beyond === 'refuse') return 'nothing can be judged';
  if (beyond === 'hold') return 'its last value holds';
  return `its last value goes on by ${plainNumber(beyond.slopeDbPerDecade, 2)} dB/decade`;
}

/** Four digits that matter, without zeros that say nothing. */
function digits(value: number): string {
  return value.toPrecision(4);
}
