/** Turns places into spans of the text. */
import { insideOf } from './inside';
import { locate, spanOfLocated } from './locate';
import type { Place, Span } from './place';
import type { Reading } from './reading';

/** The span of a place; where it is missing, of the key of the nearest thing above it that exists. */
export function spanOf(reading: Reading, place: Place): Span {
  const located = locate(insideOf(reading), place);
  if (located !== null) return spanOfLocated(located, place.part ?? 'value');
  const first = insideOf(reading).slices[0];
  const pair = first?.reading.pairs[0];
  if (first === undefined || pair === undefined) return { start: 0, end: 0 };
  return { start: first.slice.start + pair.keyStart, end: first.slice.start + pair.keyEnd };
}

/** Whether something is written at a place, by the channel itself or by what it names. */
export function exists(reading: Reading, place: Place): boolean {
  const located = locate(insideOf(reading), place);
  return located !== null && located.missing.length === 0 && located.node !== null;
}
