/** Hover of time slots: what one leaves in the next, and what room there is. */
import { pulseSeconds, widthSeconds, type Figures } from '../../analysis';
import type { Channel, Slots } from '../../spec';
import { formatDb, formatFrequency, formatTime } from '../../units/format';
import { knownRows, type Answer } from './answer';
import type { Subject } from './subject';

/** The channel's slots, or null where it has none. */
export function slotsHover({ channel, figures }: Subject): Answer | null {
  const { slots } = channel;
  if (slots === null) return null;
  const crosstalkDb = figures.crosstalk ?? crosstalkOf(slots);
  const each = 1 / figures.rate / slots.count;
  return {
    headline: `${slots.count} slots: ${formatDb(crosstalkDb)} from one into the next`,
    rows: knownRows(
      ['each slot', formatTime(each)],
      ['the pulse in it', formatTime(pulseOf(channel, figures))],
      ['guard', formatTime(slots.guardSeconds)],
      ['time constant of the link', `${formatTime(1 / (2 * Math.PI * slots.linkHz))}, from ${formatFrequency(slots.linkHz)}`],
      ['6 dB less for each', `${formatTime(Math.LN2 / (2 * Math.PI * slots.linkHz))} of guard`],
    ),
    formula: 'A first-order link of corner B falls by 20·log10(e)·2π·B·guard before the next slot opens',
  };
}

/** dB, from the guard alone. */
function crosstalkOf({ guardSeconds, linkHz }: Slots): number {
  return -20 * Math.LOG10E * 2 * Math.PI * linkHz * guardSeconds;
}

/** How long what leaves in a slot lasts. */
function pulseOf({ gate, pulse }: Channel, { rate }: Figures): number {
  if (gate === null) return pulseSeconds(pulse, rate);
  if (gate.kind === 'track') return widthSeconds({ share: 1 }, rate);
  return pulseSeconds(gate.pulse, rate);
}
