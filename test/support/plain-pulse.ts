/** Every pulse by the plain formula of its spectrum, as any Fourier-transform table has it; shares nothing with the program. */
import type { Pulse } from '../../src/spec/channel';

/** Lengths in seconds: width, edge or decay. */
interface Lengths {
  readonly w: number;
  readonly e: number;
}

const sinc = (x: number): number => (x === 0 ? 1 : Math.sin(Math.PI * x) / (Math.PI * x));

const cosineOver = (x: number): number =>
  Math.abs(1 - (2 * x) ** 2) < 1e-9 ? Math.PI / 4 : Math.cos(Math.PI * x) / (1 - (2 * x) ** 2);

/** |P(f)|, unit area. */
const spectra: Readonly<Record<Exclude<Pulse['shape'], 'instant'>, (f: number, lengths: Lengths) => number>> = {
  rectangle: (f, { w }) => sinc(f * w),
  triangle: (f, { w }) => sinc((f * w) / 2) ** 2,
  linear: (f, { w }) => sinc((f * w) / 2) ** 2,
  'half-sine': (f, { w }) => cosineOver(f * w),
  'raised-cosine': (f, { w, e }) => sinc(f * (w - e)) * cosineOver(f * e),
  trapezoid: (f, { w, e }) => sinc(f * (w - e)) * sinc(f * e),
  exponential: (f, { w, e }) => {
    const decay = Math.exp(-w / e);
    const turn = 2 * Math.PI * f * w;
    const numerator = Math.hypot(1 - decay * Math.cos(turn), decay * Math.sin(turn));
    return numerator / (Math.hypot(1, 2 * Math.PI * f * e) * (1 - decay));
  },
  split: (f, { w }) => (f === 0 ? 0 : Math.sin((Math.PI * f * w) / 2) ** 2 / ((Math.PI * f * w) / 2)),
};

const areas: Readonly<Record<Exclude<Pulse['shape'], 'instant'>, (lengths: Lengths) => number>> = {
  rectangle: ({ w }) => w,
  triangle: ({ w }) => w / 2,
  linear: ({ w }) => w / 2,
  'half-sine': ({ w }) => (2 / Math.PI) * w,
  'raised-cosine': ({ w, e }) => w - e,
  trapezoid: ({ w, e }) => w - e,
  exponential: ({ w, e }) => e * (1 - Math.exp(-w / e)),
  split: ({ w }) => w,
};

/** |P(f)| of a pulse at a rate. */
export function plainSpectrum(pulse: Pulse, rateHz: number, f: number): number {
  return pulse.shape === 'instant' ? 1 : Math.abs(spectra[pulse.shape](f, lengthsOf(pulse, rateHz)));
}

/** (area/T)·|P(f)|: what a hold of height 1 makes of a tone. */
export function plainHold(pulse: Pulse, rateHz: number, f: number): number {
  if (pulse.shape === 'instant') throw new Error('an instant has no area');
  return areas[pulse.shape](lengthsOf(pulse, rateHz)) * rateHz * plainSpectrum(pulse, rateHz, f);
}

function lengthsOf(pulse: Exclude<Pulse, { readonly shape: 'instant' }>, rateHz: number): Lengths {
  if (pulse.shape === 'linear') return { w: 2 / rateHz, e: 0 };
  const seconds = (length: { readonly seconds: number } | { readonly share: number }): number =>
    'seconds' in length ? length.seconds : length.share / rateHz;
  const e = 'edge' in pulse ? seconds(pulse.edge) : 'decay' in pulse ? seconds(pulse.decay) : 0;
  return { w: seconds(pulse.width), e };
}
