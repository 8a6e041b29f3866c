/** Declares the inner maps of stages: sections by Q, and sections by their parts. */
import { fields, plainNumber, quantity, tolerated, within, word } from '../shapes';
import { cornerShares, qualities } from './bounds';

const resistor = (role: string) => ({
  shape: tolerated('resistance'),
  about: `The ${role} resistor, with its tolerance: \`4k7 ± 1 %\`.`,
  required: true as const,
});

const capacitor = (role: string) => ({
  shape: tolerated('capacitance'),
  about: `The ${role} capacitor, with its tolerance: \`2n2 ± 5 %\`.`,
  required: true as const,
});

/** Series R, shunt C. */
export const rc = fields('an rc section', { r: resistor('series'), c: capacitor('shunt') });

/** Series C, shunt R. */
export const cr = fields('a cr section', { r: resistor('shunt'), c: capacitor('series') });

/** Series R and L, shunt C. */
export const rlc = fields('an rlc section', {
  r: resistor('series'),
  l: { shape: tolerated('inductance'), about: 'The series coil, with its tolerance: `10 µH ± 5 %`.', required: true },
  c: capacitor('shunt'),
});

/** One section by its natural frequency and Q. */
export const secondOrder = fields('a second-order section', {
  frequency: { shape: quantity('frequency'), about: 'The natural frequency.', required: true },
  q: {
    shape: plainNumber(...qualities),
    about: 'The quality factor, a plain number: 0.7071 is as flat as can be.',
    required: true,
  },
  kind: {
    shape: word({
      lowpass: 'Passes what is below.',
      highpass: 'Passes what is above.',
      bandpass: 'Passes what is near, with gain 1 at its centre.',
      notch: 'Stops its own frequency.',
      allpass: 'Passes everything, and only delays it.',
    }),
    about: 'What the section lets through.',
    fallback: 'lowpass',
  },
});

const share = within(quantity('share'), cornerShares);

/** How far a stage may be off. */
export const tolerance = fields('a tolerance', {
  corner: { shape: share, about: 'How far the corner may be off, either way; the whole stage moves as one.' },
  q: { shape: share, about: 'How far the Q of each section may be off, either way.' },
  gain: { shape: share, about: 'How far the gain may be off, either way.' },
});
