/** Declares the stages of an analogue path, and `filters`, where stages get a name. */
import { either, entries, fields, later, listOf, nameOf, quantity, text } from '../shapes';
import type { TypeOf } from '../shape';
import { familyClash, familyKeys } from './family';
import { measuredKeys } from './measured';
import { rootClash, rootKeys } from './roots';
import { cr, rc, rlc, secondOrder, tolerance } from './stage-parts';

const laterKeys = {
  'sallen-key': later('A Sallen-Key section by its parts.'),
  'multiple-feedback': later('A multiple-feedback section by its parts.'),
  ladder: later('A passive ladder, loaded as it stands.'),
  amplifier: later('The amplifier of an active section.'),
  noise: later("The noise density at the stage's own input."),
  flicker: later('The 1/f corner of that noise.'),
  build: later('The parts that the stage is made of.'),
} as const;

/** One stage. */
export const stage = fields(
  'a stage',
  {
    name: { shape: text, about: 'What messages and plots call the stage, and what `enters` of a source names.' },
    ...familyKeys,
    'second-order': { shape: secondOrder, about: 'One section by its natural frequency and Q.' },
    rc: { shape: rc, about: 'Series resistor and shunt capacitor, driven from 0 Ω and unloaded.' },
    cr: { shape: cr, about: 'Series capacitor and shunt resistor, driven from 0 Ω and unloaded.' },
    rlc: { shape: rlc, about: 'Series resistor and coil and shunt capacitor, driven from 0 Ω and unloaded.' },
    bandwidth: { shape: quantity('frequency'), about: 'One real pole: an amplifier, a sensor, a track-and-hold.' },
    ...rootKeys,
    ...measuredKeys,
    tolerance: {
      shape: tolerance,
      about: 'How far the stage may be off; parts carry their own.',
      with: ['family', 'second-order', 'bandwidth', 'poles', 'measured'],
    },
    ...laterKeys,
  },
  {
    decidedBy: [
      'family',
      'second-order',
      'rc',
      'cr',
      'rlc',
      'bandwidth',
      'poles',
      'measured',
      'sallen-key',
      'multiple-feedback',
      'ladder',
    ],
    check: (model) => familyClash(model) ?? rootClash(model) ?? toleranceClash(model),
  },
);

/** A table has no sections and one real pole no Q. */
function toleranceClash(model: {
  readonly tolerance?: { readonly q?: unknown } | null;
  readonly measured?: string | null;
  readonly bandwidth?: unknown;
}) {
  if (model.tolerance?.q === undefined || (!model.measured && !model.bandwidth)) return null;
  return { key: 'tolerance', message: `a stage by its ${model.measured ? 'table' : 'bandwidth'} has no Q that could be off` };
}

/** A stage, or a list of stages in series. */
export const stages = either(stage, listOf(stage));

/** What a channel's `filter` takes: the same, or a name. */
export const filter = either(nameOf('filters'), stage, listOf(stage));

/** All filters of a file by name. */
export const filters = entries('a filter', stages);

/** A stage as it was written. */
export type StageModel = TypeOf<typeof stage>;

/** Stages as they were written. */
export type StagesModel = TypeOf<typeof stages>;

/** What a channel's `filter` was written as. */
export type FilterModel = TypeOf<typeof filter>;
