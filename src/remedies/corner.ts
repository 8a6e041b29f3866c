/** What a fix may turn of a family stage's corners: the corner, or the width of a band and then each of its edges. */
import { editValue, spanOf, type Edit, type Path } from '../spec';
import { formatFrequency } from '../units/format';
import { formatSpecRange } from '../units/format-spec';
import type { Knob } from './knob';
import { rewriteQuantity } from './quantity-text';
import type { Session } from './session';
import type { FamilyStage } from './stages';

/** The knobs of one stage, the plainest first. */
export function cornerKnobs(session: Session, stage: FamilyStage): readonly Knob[] {
  const { cornerHz, upperCornerHz } = stage.form;
  if (upperCornerHz === null) return [cornerKnob(session, stage)];
  const band: Band = { low: cornerHz, high: upperCornerHz };
  return [widthKnob(session, stage, band), edgeKnob(session, stage, band, 'low'), edgeKnob(session, stage, band, 'high')];
}

interface Band {
  readonly low: number;
  readonly high: number;
}

function cornerKnob(session: Session, stage: FamilyStage): Knob {
  const present = stage.form.cornerHz;
  return {
    kind: 'corner',
    present,
    words: formatFrequency,
    change: (hz) => {
      const place = { channel: session.channel.name, path: pathOf(stage, 'corner') };
      const { start, end } = spanOf(session.reading, place);
      const text = rewriteQuantity(session.reading.text.slice(start, end), present, hz, 'Hz');
      const edit = editValue(session.reading, place, text);
      const says = `${hz > present ? 'Raise' : 'Lower'} the corner of ${stage.words} to ${formatFrequency(hz)}`;
      return edit === null ? null : { kind: 'corner', says, about: stage.words, edits: [edit] };
    },
  };
}

/** The width between the corners, about their geometric middle, where a band filter has its centre. */
function widthKnob(session: Session, stage: FamilyStage, { low, high }: Band): Knob {
  const square = low * high;
  return {
    kind: 'corner',
    present: high - low,
    words: (width) => `a width of ${formatFrequency(width)}`,
    change: (width) => {
      const upper = (width + Math.sqrt(width * width + 4 * square)) / 2;
      const verb = width > high - low ? 'Widen' : 'Narrow';
      return bandChange(session, stage, { low: square / upper, high: upper }, `${verb} ${stage.words}`);
    },
  };
}

function edgeKnob(session: Session, stage: FamilyStage, band: Band, edge: 'low' | 'high'): Knob {
  const present = band[edge];
  return {
    kind: 'corner',
    present,
    words: (hz) => `${edge === 'low' ? 'a lower' : 'an upper'} corner of ${formatFrequency(hz)}`,
    change: (hz) => {
      const moved = { ...band, [edge]: hz };
      if (moved.low >= moved.high) return null;
      const verb = hz > present ? 'Raise' : 'Lower';
      return bandChange(session, stage, moved, `${verb} the ${edge === 'low' ? 'lower' : 'upper'} corner of ${stage.words}`);
    },
  };
}

function bandChange(session: Session, stage: FamilyStage, band: Band, verb: string): ReturnType<Knob['change']> {
  const rounded = roundedBand(band);
  const text = formatSpecRange({ low: { value: rounded.low, unit: 'Hz' }, high: { value: rounded.high, unit: 'Hz' } });
  const edit: Edit | null = editValue(session.reading, { channel: session.channel.name, path: pathOf(stage, 'corners') }, text);
  return edit === null ? null : { kind: 'corner', says: `${verb} to ${text}`, about: stage.words, edits: [edit] };
}

/** Both corners to a thousandth of the band, and to four figures at least. */
function roundedBand({ low, high }: Band): Band {
  const digits = Math.min(12, Math.max(4, Math.ceil(Math.log10(high / (high - low))) + 3));
  return { low: Number(low.toPrecision(digits)), high: Number(high.toPrecision(digits)) };
}

function pathOf(stage: FamilyStage, key: string): Path {
  return [...stage.path, key];
}
