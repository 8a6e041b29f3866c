/** The change of a part of an `rc`, `cr` or `rlc` stage to the next standard value that works. */
import { editValue, spanOf, stagePath, type Path, type Stage, type StagePart } from '../spec';
import type { Unit } from '../units/quantity';
import { formatPrefixed } from '../units/format';
import type { Change } from './change';
import { rewritePart } from './part-text';
import { neighbour, seriesOf } from './preferred-values';
import type { Session } from './session';
import { stepwiseTrial } from './stepwise';
import { works, type Trial } from './trial';

/** How many neighbours of a value are tried on either side: a decade of E12. */
const mostSteps = 12;

/** Proved changes of parts, one for each stage: a capacitor is changed rather than a resistor or a coil. */
export function* partTrials(session: Session): Generator<void, readonly Trial[]> {
  const trials: Trial[] = [];
  for (const [index, stage] of session.channel.stages.entries()) {
    for (const part of [...stage.parts].sort((a, b) => byChoice(a) - byChoice(b))) {
      const place = partPlace(session, stage, index, part);
      const change = (step: number): Change | null => partChange(session, place, part, step);
      const trial = yield* stepwiseTrial(session, { change, most: mostSteps });
      if (trial === null || !works(trial)) continue;
      trials.push(trial);
      break;
    }
  }
  return trials;
}

const choice = ['c', 'r', 'l'];
const units: Readonly<Record<StagePart['part'], Unit & ('Ω' | 'F' | 'H')>> = { r: 'Ω', c: 'F', l: 'H' };

function byChoice({ part }: StagePart): number {
  return choice.indexOf(part);
}

interface PartPlace {
  readonly path: Path;
  readonly words: string;
}

function partPlace({ channel }: Session, stage: Stage, index: number, { part }: StagePart): PartPlace {
  const named = stage.name === null && /^stage \d+$/u.test(stage.label) ? stage.label : `\`${stage.label}\``;
  return { path: [...stagePath(channel, index), stage.form.kind, part], words: `${part.toUpperCase()} of ${named}` };
}

function partChange(
  { reading, channel }: Session,
  { path, words }: PartPlace,
  { part, value }: StagePart,
  step: number,
): Change | null {
  const next = neighbour(seriesOf(value), value, step);
  const place = { channel: channel.name, path };
  const { start, end } = spanOf(reading, place);
  const edit = editValue(reading, place, rewritePart(reading.text.slice(start, end), next, units[part]));
  const says = `${next > value ? 'Raise' : 'Lower'} ${words} to ${formatPrefixed(next, units[part], 3)}`;
  return edit === null ? null : { kind: 'part', says, about: null, edits: [edit] };
}
