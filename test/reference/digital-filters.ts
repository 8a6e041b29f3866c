/** The outside values of digital filters, typed; where they stem from stands in the file itself. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';

/** One designed filter: what was asked for, its largest deviation, and its taps as the file says. */
interface Designed {
  readonly count: number;
  readonly deviation: number;
  readonly taps: readonly number[];
}

/** What the file holds. */
export interface DigitalFilterVectors {
  /** Rows: frequency over the lower rate, droop in dB, attenuation in dB at 1 less that. */
  readonly cic: readonly {
    readonly by: number;
    readonly delay: number;
    readonly stages: number;
    readonly growthBits: number;
    readonly rows: readonly (readonly [share: number, droopDb: number, aliasDb: number])[];
  }[];
  /** Frequency over the lower rate, then dB for 1 … 6 stages, in the limit of a large ratio. */
  readonly longCicDroop: readonly (readonly number[])[];
  /** Delay, frequency over the lower rate, then dB for 1 … 6 stages. */
  readonly longCicAlias: readonly (readonly number[])[];
  readonly kaiser: readonly { readonly attenuationDb: number; readonly width: number; readonly order: number }[];
  readonly equiripple: readonly (Designed & {
    readonly edges: readonly number[];
    readonly desired: readonly number[];
    readonly weights: readonly number[];
  })[];
  readonly halfBand: readonly (Designed & { readonly passband: number; readonly stopDb: number })[];
  readonly inverseSinc: readonly (Designed & { readonly edge: number })[];
}

/** Reads them. */
export function readDigitalFilters(): DigitalFilterVectors {
  const path = join(import.meta.dirname, 'digital-filters.json');
  return JSON.parse(readFileSync(path, 'utf8')) as DigitalFilterVectors;
}
