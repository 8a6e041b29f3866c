/** `image-over-limit`: a copy of the wanted band leaves above the image limit. */
import type { Figures, ImageFigure, LimitFigure } from '../analysis/figures';
import { formatDb } from '../units/format';
import { findingIn, limitAndFilter, limitPath } from './build';
import type { Finding } from './finding';
import { frequencyWords } from './frequency-words';
import type { FindingKind, Help, Subject } from './kind';
import { breaks, brokenLimit, nominalPasses } from './limits';
import { decimalsFor, limitWords, worstCaseWords } from './wording';

const help: Help = {
  summary: 'A copy of the wanted band leaves the output above the image limit.',
  means: `A train of samples at a rate fs carries the wanted band not only where it belongs but also at k·fs ± f for every whole k. The
hold weakens the copies by its own spectrum at the frequency where they leave, the filter behind it by its response there. What
remains of this copy is stronger than \`limits.image\` allows, at the worst frequency of the band and of all tolerances. There is one
finding for each copy and side that breaks the limit.`,
  matters: `The copy is radiated, heard, or folded back by whatever samples next. Behind a power stage it also costs current and heat.`,
  cure: `A higher rate moves the copies away from the band and into the filter; a higher order or a lower corner weakens them more. A wider
hold puts a null where the first copies stand, at the price of droop.`,
  example: {
    spec: `bandkeep: 1
channels:
  fish-sounder:
    direction: generate
    wanted: { band: 100 Hz .. 2 kHz, level: -6 dBFS }
    rate: 16 kHz
    filter: { family: butterworth, order: 3, corner: 4 kHz }
    limits: { image: -60 dBc }
`,
    from: 'order: 3',
    to: 'order: 5',
  },
};

/** The finding code `image-over-limit`. */
export const imageOverLimit: FindingKind = {
  code: 'image-over-limit',
  severity: 'error',
  group: 'copies',
  help,
  remedies: ['rate', 'pulse', 'corner', 'part', 'order', 'family'],
  check: (subject) => {
    const limit = brokenLimit(subject.figures, 'image');
    if (limit === null) return [];
    return copies(subject.figures)
      .filter((image) => breaks(image.margin))
      .map((image) => over(subject, limit, image));
  },
};

/** "The lower copy at k = 1". */
function copyWords(image: ImageFigure): string {
  return image.side === 'baseband' ? 'The copy in the baseband' : `The ${image.side} copy at k = ${image.copy}`;
}

/** The listed copies, and the strongest of all where it lies beyond the list. */
function copies(figures: Figures): readonly ImageFigure[] {
  const strongest = figures.image;
  const beyond =
    strongest !== null && !figures.images.some((image) => image.copy === strongest.copy && image.side === strongest.side);
  return beyond ? [...figures.images, strongest] : figures.images;
}

function over({ channel, figures }: Subject, limit: LimitFigure, image: ImageFigure): Finding {
  const strongest = figures.image?.copy === image.copy && figures.image.side === image.side;
  const value = limit.unit === 'dBc' ? image.relative : image.level;
  const nominal = strongest ? limit.nominal : limit.unit === 'dBc' ? null : image.nominal;
  const margin = image.margin ?? 0;
  const decimals = decimalsFor('image', margin);
  const worst = { worstAt: image.worstAt, nominal, nominalPasses: nominalPasses(limit, nominal), decimals };
  const from = frequencyWords(figures, image.from);
  const leaves = `leaves at ${frequencyWords(figures, image.frequency)} at ${formatDb(value, limit.unit, decimals)}`;
  const by = `${formatDb(-margin, 'dB', decimals)} over the image limit of ${limitWords(limit)}`;
  return findingIn(channel, {
    code: 'image-over-limit',
    severity: 'error',
    message: `${copyWords(image)} of ${from} ${leaves}, ${by}${worstCaseWords(worst)}.`,
    path: limitPath(channel, limit),
    ref: limit.ref,
    related: limitAndFilter(channel, limit),
    figures: { value, nominal, limit: limit.at, margin, frequency: image.frequency, lands: image.from },
    limit: 'image',
  });
}
