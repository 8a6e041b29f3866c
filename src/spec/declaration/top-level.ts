/** The one declaration of the language: the keys at the top of a file, and through them everything below. */
import { entries, fields, listOf, path, text, whole } from '../shapes';
import type { TypeOf } from '../shape';
import { channel } from './channel';
import { clocks } from './clock';
import { masks } from './mask';
import { sources } from './source';
import { filters } from './stage';

/** A whole file. Readers, hovers, completion and the reference page are walks over it. */
export const declaration = fields('a spec', {
  bandkeep: { shape: whole(1, 1), about: 'The version of the language, 1.', required: true },
  title: { shape: text, about: 'What the spec is about.' },
  notes: { shape: text, about: 'Anything worth knowing.' },
  use: {
    shape: listOf(path),
    about: 'Other specs, by relative path, whose clocks, sources, filters and masks may be named here.',
  },
  clocks: { shape: clocks, about: 'Clocks by name: frequency, tolerance and jitter.' },
  sources: { shape: sources, about: "Unwanted sources by name, for any channel's `unwanted`." },
  filters: { shape: filters, about: 'Filters by name: a stage, or a list of stages in series.' },
  masks: { shape: masks, about: 'Masks by name: lists of segments.' },
  channels: { shape: entries('a channel', channel), about: 'Channels by name.' },
});

/** A file as it was written. */
export type FileModel = TypeOf<typeof declaration>;
