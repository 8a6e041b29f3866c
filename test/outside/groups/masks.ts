/** The masks of published standards, as the specs in examples/standards write them, against what was written down of them, with its marks. */
import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { read, type Channel, type MaskSegment } from '../../../src/spec';
import { exampleText } from '../../support/examples';
import type { OutsideGroup } from '../group';

interface Point {
  readonly kind?: string;
  readonly f_Hz?: number | readonly [number, number];
  readonly value_dB?: number | null;
  readonly value_Hz?: number | readonly [number, number];
}

/** What was written down: read from a copy (a), second-hand (a2), or from memory (c), as each point is marked. */
const standards = (
  JSON.parse(readFileSync(join(import.meta.dirname, '../../reference/masks.json'), 'utf8')) as {
    readonly masks: readonly { readonly standard: string; readonly fs_Hz?: number; readonly points: readonly Point[] }[];
  }
).masks;

function pointsOf(name: RegExp): readonly Point[] {
  const found = standards.find(({ standard }) => name.test(standard));
  assert.ok(found !== undefined, String(name));
  return found.points;
}

function channelOf(file: string, name: string): Channel {
  const entry = read(exampleText(`standards/${file}`)).entries.find((one) => one.name === name);
  const channel = entry?.channel ?? null;
  assert.ok(channel !== null, `${file} has no whole ${name}`);
  return channel;
}

/** What a channel's mask asks at a frequency: the strictest of all segments there. */
function asked(channel: Channel, frequencyHz: number): { readonly lower: number; readonly upper: number } {
  const segments = channel.masks.flatMap((mask) => mask.segments);
  const there = segments.filter(({ lowHz, highHz }) => lowHz <= frequencyHz && frequencyHz <= highHz);
  return {
    lower: Math.max(-Infinity, ...there.map((segment) => edgeAt(segment, 'lower', frequencyHz) ?? -Infinity)),
    upper: Math.min(Infinity, ...there.map((segment) => edgeAt(segment, 'upper', frequencyHz) ?? Infinity)),
  };
}

function edgeAt(segment: MaskSegment, side: 'lower' | 'upper', frequencyHz: number): number | null {
  const edge = segment[side];
  if (edge === null) return null;
  if (edge.fromDb === edge.toDb) return edge.fromDb;
  return edge.fromDb + ((edge.toDb - edge.fromDb) * (frequencyHz - segment.lowHz)) / (segment.highHz - segment.lowHz);
}

const slackDb = 1e-9;

/** The group. */
export const masks: OutsideGroup = {
  title: 'Masks of standards',
  source: 'ITU-R BT.601 (two losses second-hand), G.711 and G.712 (rate, reference), AES17; the rest from memory of them',
  define: (tally) => {
    for (const [name, channel, edgeHz] of [
      [/BT.601 luminance/, channelOf('bt601-video', 'ladder-camera-y'), 5.75e6],
      [/BT.601 colour/, channelOf('bt601-video', 'ladder-camera-c'), 2.75e6],
    ] as const) {
      it(`asks what ${name.source} asks`, () => {
        tally.exact(channel.rate.hz, standards.find(({ standard }) => name.test(standard))?.fs_Hz, 'rate');
        tally.exact(channel.wanted[0]?.highHz, edgeHz, 'pass band');
        for (const { kind = '', f_Hz: f, value_dB: db } of pointsOf(name)) {
          if (typeof f !== 'number' || typeof db !== 'number') continue;
          const { lower, upper } = asked(channel, f);
          if (kind.startsWith('insertion')) tally.decibels(upper, -db, slackDb, `${f} Hz`);
          else {
            // On a joint the stricter neighbour counts, so the wider segment is looked at just inside.
            const inside = asked(channel, f - 1);
            tally.decibels(inside.upper, db, slackDb, `${f} Hz`);
            tally.decibels(inside.lower, -db, slackDb, `${f} Hz`);
            assert.ok(lower <= 0 && upper >= 0);
          }
        }
      });
    }

    it('asks what G.712 asks of both directions, against 1020 Hz, at the rate of G.711', () => {
      const channel = channelOf('g712-speech', 'talk-back');
      tally.exact(
        channel.referenceHz,
        pointsOf(/^CCITT/).find(({ kind }) => kind === 'reference frequency')?.value_Hz,
        'reference',
      );
      tally.exact(channel.rate.hz, pointsOf(/G.711/)[0]?.value_Hz, 'rate');
      for (const { kind = '', f_Hz: band, value_dB: db } of pointsOf(/^CCITT/)) {
        if (!kind.startsWith('attenuation') || typeof db !== 'number' || typeof band !== 'object') continue;
        const [low, high] = band;
        const middle = asked(channel, 0.5 * (low + high));
        // The table has losses, the mask gains.
        if (kind.includes('lower')) tally.decibels(middle.upper, -db, slackDb, `loss at least, ${low} .. ${high} Hz`);
        else tally.decibels(middle.lower, -db, slackDb, `loss at most, ${low} .. ${high} Hz`);
      }
      tally.decibels(asked(channel, 4600).upper, -25, slackDb, 'image of 4.6 kHz');
    });

    it('asks for at least the roll-off of one direction, and for a third of a dB more at most', () => {
      const channel = channelOf('g712-speech', 'talk-back, one direction');
      for (let f = 3400; f <= 4600; f += 1) {
        const loss = 14 * (1 - Math.sin((Math.PI * (4000 - f)) / 1200));
        const { upper } = asked(channel, f);
        assert.ok(-upper >= loss - slackDb && -upper <= loss + 1 / 3, `${f} Hz: ${-upper} dB for ${loss} dB`);
      }
      for (const { f_Hz: f, value_dB: db } of pointsOf(/^3400/)) {
        if (typeof f !== 'number' || typeof db !== 'number') continue;
        tally.decibels(14 * (1 - Math.sin((Math.PI * (4000 - f)) / 1200)), db, slackDb, `the formula at ${f} Hz`);
      }
    });

    it('asks what AES17 asks', () => {
      const channel = channelOf('aes17-measurement', 'analyser');
      const [pass, stop] = pointsOf(/AES17/);
      for (const f of [10, 997, 20e3]) {
        tally.decibels(asked(channel, f).upper, pass?.value_dB ?? NaN, slackDb, `${f} Hz`);
        tally.decibels(asked(channel, f).lower, -(pass?.value_dB ?? NaN), slackDb, `${f} Hz`);
      }
      for (const f of [24e3, 1e9]) tally.decibels(asked(channel, f).upper, -(stop?.value_dB ?? NaN), slackDb, `${f} Hz`);
    });
  },
};
