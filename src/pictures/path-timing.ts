/** Phase and group delay of the whole path, drawn when the reader asks for them; only for a path whose stages all have a phase. */
import { pathDelay, pathPhaseRad, wantedPhaseRad } from '../analysis';
import type { Item, LevelUnit, Plot, Points } from '../protocol/picture';
import { formatDb, formatFrequency, formatTime } from '../units/format';
import { item } from './items';
import { wholePathAxis } from './path-magnitude';
import { sampleCurve } from './sample-curve';
import { filterPlace } from './subject';
import type { Subject } from './subject';
import { sentences } from './words';

/** Phase in degrees, the pulse's included as far as it is a delay. */
export function phasePlot(subject: Subject): Plot {
  const { channel, path } = subject;
  const pulse = (f: number): number => wantedPhaseRad(channel, channel.rate.hz, f);
  const degrees = (f: number): number => (((pathPhaseRad(path, f) ?? NaN) + pulse(f)) * 180) / Math.PI;
  const words = `Phase, ${formatDb(degrees(channel.referenceHz), 'degrees')} at ${formatFrequency(channel.referenceHz)}`;
  return timingPlot(subject, { id: 'phase', title: 'Phase', unit: 'deg', curve: degrees, words });
}

/** Group delay in the unit that keeps it readable. */
export function delayPlot(subject: Subject): Plot {
  const { channel, figures, path } = subject;
  const delay = (f: number): number => pathDelay(path, f) ?? NaN;
  const { unit, seconds } = timeUnit(delay(channel.referenceHz));
  const spread = figures.delaySpread === null ? '' : `, varying by ${formatTime(figures.delaySpread)} over the wanted band`;
  const words = `Group delay, ${formatTime(delay(channel.referenceHz))} at ${formatFrequency(channel.referenceHz)}${spread}`;
  return timingPlot(subject, {
    id: 'group-delay',
    title: 'Group delay',
    unit,
    curve: (f) => delay(f) / seconds,
    words,
  });
}

interface Timing {
  readonly id: 'phase' | 'group-delay';
  readonly title: string;
  readonly unit: LevelUnit;
  readonly curve: (frequencyHz: number) => number;
  readonly words: string;
}

function timingPlot(subject: Subject, { id, title, unit, curve, words }: Timing): Plot {
  const x = { ...wholePathAxis(subject), highHz: 4 * subject.channel.rate.hz };
  const rough = sampleCurve(curve, { lowHz: x.logLowHz, highHz: x.highHz, through: [], floor: -Infinity, tolerance: Infinity });
  const [least, most] = [Math.min(...rough.y), Math.max(...rough.y, 0)];
  const room = Math.max((most - least) * 0.08, 1e-9);
  const { channel } = subject;
  const edges = channel.wanted.flatMap((band) => [band.lowHz, band.highHz]);
  const through = [...edges, channel.referenceHz];
  const points = sampleCurve(curve, {
    lowHz: x.lowHz,
    highHz: x.highHz,
    through,
    floor: -Infinity,
    tolerance: (most - least) / 3000,
  });
  return {
    id,
    title,
    words,
    shown: 'on demand',
    panes: [{ id, x, y: { title: unit, unit, low: least - room, high: most + room } }],
    series: [{ id, name: title.toLowerCase(), role: 'total', place: filterPlace(subject) }],
    items: [curveItem(subject, { id, title, words }, points), ...edgeItems(subject, id)],
    table: {
      caption: `${channel.name}: ${title.toLowerCase()}`,
      columns: [
        { title: 'at', unit: 'Hz' },
        { title: title.toLowerCase(), unit },
      ],
      rows: [...new Set(through)].sort((a, b) => a - b).map((f) => ({ item: id, cells: [f, curve(f)] })),
    },
  };
}

function curveItem(subject: Subject, { id, title, words }: Pick<Timing, 'id' | 'title' | 'words'>, points: Points): Item {
  return item({
    id,
    series: id,
    pane: id,
    role: 'total',
    name: title.toLowerCase(),
    words: sentences(words),
    place: filterPlace(subject),
    shapes: [{ kind: 'curve', points, stroke: 'solid', weight: 'bold' }],
  });
}

function edgeItems({ channel, placeOf }: Subject, pane: string): Item[] {
  return channel.wanted.map((band, index) =>
    item({
      id: `${pane}-edge-${index}`,
      series: pane,
      pane,
      role: 'rule',
      name: 'edge of the wanted band',
      words: sentences(`The wanted band ends at ${formatFrequency(band.highHz)}`),
      place: placeOf(['wanted', index]),
      shapes: [{ kind: 'rule', frequencyHz: band.highHz }],
    }),
  );
}

function timeUnit(seconds: number): { readonly unit: LevelUnit; readonly seconds: number } {
  const size = Math.abs(seconds);
  if (size >= 1) return { unit: 's', seconds: 1 };
  if (size >= 1e-3) return { unit: 'ms', seconds: 1e-3 };
  return size >= 1e-6 ? { unit: 'µs', seconds: 1e-6 } : { unit: 'ns', seconds: 1e-9 };
}
