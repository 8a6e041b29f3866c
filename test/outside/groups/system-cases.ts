/** Whole channels from spec text to figures, against cases that were computed elsewhere by plain numerics. */
import { foldFrequency, rateWindows } from '../../../src/signal/folding';
import { bandLines, captureLines, caseOf, figuresOf, filterLine, type Case } from '../case-spec';
import type { OutsideGroup, Tally } from '../group';

interface Point {
  readonly source_Hz: number;
  readonly alias_Hz: number;
  readonly level_dBFS: number;
}

interface Interferer {
  readonly alias_Hz: number;
  readonly in_band: boolean;
  readonly level_at_output_dBFS: number | null;
  readonly f_Hz: number;
}

/** Relative; searches stop where the level is proved to a thousandth of a dB, not where the place is. */
const placeRelative = 1e-6;

function tallyCapture(tally: Tally, { id, given, expected, tolerance }: Case): void {
  const figures = figuresOf(captureLines(given));
  tally.decibels(figures.droop ?? NaN, expected['droop_at_upper_edge_dB'] as number, tolerance.gain_dB, `${id}, droop`);
  (expected['interferers'] as readonly Interferer[]).forEach((one, index) => {
    const alias = figures.aliases[index];
    tally.exact(alias?.frequency ?? null, one.in_band ? one.f_Hz : null, `${id}, whether ${one.f_Hz} Hz lands in the band`);
    if (!one.in_band) return;
    tally.relative(1 + (alias?.lands ?? NaN), 1 + one.alias_Hz, placeRelative, `${id}, where ${one.f_Hz} Hz lands`);
    // "null" stands for an exact null.
    const level = alias?.level ?? NaN;
    if (one.level_at_output_dBFS === null) tally.exact(level < -200, true, `${id}, null at ${one.f_Hz} Hz`);
    else tally.decibels(level, one.level_at_output_dBFS, tolerance.level_dB, `${id}, ${one.f_Hz} Hz`);
  });
  const worst = (expected['worst_any_tone'] ?? expected['worst_in_band_alias']) as Point;
  tally.relative(figures.alias?.frequency ?? NaN, worst.source_Hz, placeRelative, `${id}, worst alias from`);
  tally.decibels(figures.alias?.level ?? NaN, worst.level_dBFS, tolerance.level_dB, `${id}, worst alias`);
}

function tallyGenerate(tally: Tally, id: string, lines: readonly (string | null)[]): void {
  const { expected, tolerance } = caseOf(id);
  const level = expected['worst_image_dBFS'] as { readonly image_Hz: number; readonly level_dBFS: number };
  const relative = expected['worst_image_dBc'] as { readonly image_Hz: number; readonly level_dBc: number };
  const inLevel = figuresOf([...lines, 'limits: { image: 0 dBFS }']).image;
  tally.decibels(inLevel?.level ?? NaN, level.level_dBFS, tolerance.level_dB, `${id}, worst image`);
  tally.relative(inLevel?.frequency ?? NaN, level.image_Hz, placeRelative, `${id}, worst image at`);
  const inRelation = figuresOf([...lines, 'limits: { image: 0 dBc }']).image;
  tally.decibels(inRelation?.relative ?? NaN, relative.level_dBc, tolerance.level_dB, `${id}, worst image against its tone`);
  tally.relative(inRelation?.frequency ?? NaN, relative.image_Hz, placeRelative, `${id}, worst image against its tone at`);
}

interface Copy {
  readonly k: number;
  readonly edges: readonly { readonly input_Hz: number; readonly gain_dB: number | null }[];
}

/** Of every copy the stronger edge: in these cases a copy is strongest at one of them. */
function tallyRelay(tally: Tally, id: string, sampling: string): void {
  const { given, expected, tolerance } = caseOf(id);
  const band = ['direction: relay', ...bandLines(given), `rate: ${given.fs_Hz} Hz`, sampling];
  const { images, limits } = figuresOf([...band, 'limits: { image: 0 dBFS, level: -60 dBFS .. 0 dBFS }']);
  for (const { k, edges } of expected['copies'] as readonly Copy[]) {
    const strongest = Math.max(...edges.map(({ gain_dB }) => gain_dB ?? -Infinity));
    const image = images.find(({ copy, side }) => copy === Math.abs(k) && side === (k > 0 ? 'upper' : 'lower'));
    const level = k === 0 ? limits.find(({ limit }) => limit === 'level')?.value : image?.level;
    tally.decibels(level ?? NaN, strongest, tolerance.level_dB, `${id}, copy ${k}`);
  }
}

function tallyHarmonics(tally: Tally): void {
  const { given, expected, tolerance } = caseOf('X11');
  const { fs_Hz: rate, f_Hz: tone = NaN, max_harmonic: most = NaN, band_Hz: band } = given;
  for (const [h, lands] of expected['harmonics'] as readonly (readonly [number, number, boolean])[])
    tally.relative(foldFrequency(h * tone, rate).landsHz, lands, placeRelative, `X11, harmonic ${h}`);
  // Of equal harmonics on a flat path the lowest in the band is the first of the strongest.
  const source = `unwanted: { name: tone, tone: ${tone} Hz, level: 0 dBFS, harmonics: { to: ${most}, slope: -20 dB/decade } }`;
  const { alias } = figuresOf([
    'direction: capture',
    `wanted: { band: ${band[0]} Hz .. ${band[1]} Hz }`,
    `rate: ${rate} Hz`,
    source,
  ]);
  const first = expected['first_harmonic_in_band'] as number;
  tally.relative(alias?.frequency ?? NaN, first * tone, placeRelative, 'X11, strongest in the band');
  tally.decibels(alias?.level ?? NaN, -20 * Math.log10(first), tolerance.level_dB, 'X11, its level');
}

function tallyRates(tally: Tally): void {
  const { given, expected } = caseOf('X08');
  const [low, high] = given.band_Hz;
  const windows = expected['windows_n_lo_hi_Hz'] as readonly (readonly [number, number, number | null])[];
  const found = rateWindows(low, high);
  for (const [zone, from, to] of windows) {
    tally.relative(found[zone - 1]?.lowHz ?? NaN, from, placeRelative, `X08, zone ${zone}`);
    tally.relative(found[zone - 1]?.highHz ?? NaN, to ?? Infinity, placeRelative, `X08, zone ${zone}`);
  }
  const whole = (rate: number): boolean => {
    const figures = figuresOf(['direction: capture', `wanted: { band: ${low} Hz .. ${high} Hz }`, `rate: ${rate} Hz`]);
    return figures.faults.every(({ kind }) => kind !== 'wanted-folds');
  };
  tally.exact(given.rates_Hz?.filter(whole), expected['allowed_rates_Hz'], 'X08, allowed rates');
}

/** X09 and X10: each order or rate with its worst alias, its droop and whether it will do. */
function tallyChoices(tally: Tally, id: 'X09' | 'X10'): void {
  const { given, expected, tolerance } = caseOf(id);
  const rows = (expected['orders'] ?? expected['rates']) as readonly (readonly (number | boolean)[])[];
  for (const row of rows) {
    const [choice, level, droop] = row as readonly number[];
    const changed = id === 'X10' ? { ...given, fs_Hz: choice ?? NaN } : given;
    const filter = filterLine(given.filter, id === 'X09' ? choice : undefined);
    const lines = captureLines(changed).filter((line) => line?.startsWith('filter') !== true);
    const figures = figuresOf([...lines, filter, `limits: { alias: ${String(given.limit_dB)} dBFS }`]);
    tally.decibels(figures.alias?.level ?? NaN, level ?? NaN, tolerance.level_dB, `${id}, ${choice}`);
    tally.decibels(figures.droop ?? NaN, droop ?? NaN, tolerance.gain_dB, `${id}, droop, ${choice}`);
    tally.exact(figures.limits[0]?.passes, row.at(-1), `${id}, ${choice} will do`);
  }
}

/** The group. */
export const systemCases: OutsideGroup = {
  title: 'Whole channels, from spec text to figures',
  source: 'plain numerics on dense grids, made apart from this project',
  define: (tally) => {
    for (const id of ['X01', 'X02', 'X03'])
      it(`${id}: aliases and droop of a capture`, () => {
        tallyCapture(tally, caseOf(id));
      });

    it('X02: quantisation and jitter in the band', () => {
      const { given, expected, tolerance } = caseOf('X02');
      const { noise, testTone } = figuresOf(captureLines(given));
      const parts = expected['noise_in_band_dBFS'] as Readonly<Record<string, number>>;
      tally.decibels(noise.quantisation ?? NaN, parts['quantisation'] ?? NaN, tolerance.level_dB, 'quantisation');
      tally.decibels(noise.jitter ?? NaN, parts['jitter'] ?? NaN, tolerance.level_dB, 'jitter');
      tally.decibels(testTone.atSampler, expected['signal_at_output_dBFS'] as number, tolerance.level_dB, 'signal');
    });

    it('X04: images of a zero-order hold behind a filter', () => {
      const { given, expected, tolerance } = caseOf('X04');
      const lines = [
        'direction: generate',
        ...bandLines(given),
        `rate: ${given.fs_Hz} Hz`,
        filterLine(given.filter),
        `bits: ${given.bits}`,
      ];
      tallyGenerate(tally, 'X04', lines);
      const { droop, noise } = figuresOf(lines);
      tally.decibels(droop ?? NaN, expected['droop_at_upper_edge_dB'] as number, tolerance.gain_dB, 'droop');
      const quantisation = expected['quantisation_noise_in_band_dBFS'] as number;
      tally.decibels(noise.quantisation ?? NaN, quantisation, tolerance.level_dB, 'quantisation');
    });

    it('X05: images of a split pulse in zone 2', () => {
      const { given } = caseOf('X05');
      const [high, low] = caseOf('X05').expected['wanted_output_band_edges_Hz'] as readonly [number, number];
      const band = ['direction: generate', `wanted: { band: ${low} Hz .. ${high} Hz }`, `rate: ${given.fs_Hz} Hz`];
      tallyGenerate(tally, 'X05', [...band, 'hold: { shape: split, width: 100 % }']);
    });

    it('X06 and X07: copies of natural and of flat-top sampling', () => {
      tallyRelay(tally, 'X06', 'gate: 25 %');
      tallyRelay(tally, 'X07', 'hold: 25 %');
    });

    it('X08: rates for an intermediate frequency', () => {
      tallyRates(tally);
    });

    it('X09 and X10: the order and the rate that will do', () => {
      tallyChoices(tally, 'X09');
      tallyChoices(tally, 'X10');
    });

    it('X11: harmonics that fold into the band', () => {
      tallyHarmonics(tally);
    });
  },
};
