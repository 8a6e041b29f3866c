/** Builds what sources may be beside plain tones and bands, for tests. */
import type { Entrance, Harmonics, Source, SpectrumPoint } from '../../src/spec/channel';

/** Harmonics up to a number, falling by 20 dB a decade unless they are said to do otherwise. */
export function falling(to: number, parts: Partial<Harmonics> = {}): Harmonics {
  return { to, slopeDbPerDecade: -20, odd: false, ...parts };
}

/** A tone or a band with harmonics. */
export function withHarmonics(source: Source, harmonics: Harmonics): Source {
  if (source.kind !== 'tone' && source.kind !== 'band') throw new RangeError(`${source.kind} has no harmonics`);
  return { ...source, harmonics };
}

/** A source that enters elsewhere. */
export function entering(source: Source, enters: Entrance): Source {
  return { ...source, enters };
}

/** A row of a table. */
export function row(frequencyHz: number, levelDb: number): SpectrumPoint {
  return { frequencyHz, levelDb };
}

/** A table of levels: an envelope, or a tone in each row. */
export function spectrum(points: readonly SpectrumPoint[], lines: 'envelope' | 'lines' = 'envelope'): Source {
  return {
    kind: 'spectrum',
    name: 'table',
    ref: null,
    enters: 'input',
    path: 'table.csv',
    points,
    lines: lines === 'lines',
    levelDb: Math.max(...points.map((point) => point.levelDb)),
  };
}
