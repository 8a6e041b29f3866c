/** Fixes of band-sampled channels: into which window they move the rate, and what they say of it. */
import assert from 'node:assert/strict';
import { windowOptions } from '../../src/remedies/rate-window';
import { capture, rate, wanted } from '../support/channel-builder';
import { after, cured, errorsIn, titles } from '../support/cured';
import { exampleText } from '../support/examples';

const echo = (changes: Readonly<Record<string, string>> = {}): string =>
  Object.entries(changes).reduce(
    (text, [from, to]) => {
      assert.equal(text.split(from).length, 2, from);
      return text.replace(from, () => to);
    },
    `bandkeep: 1
channels:
  ice-echo:
    direction: capture
    wanted: { band: 4.2 MHz .. 4.5 MHz, level: -6 dBFS }
    unwanted: { name: shoulder, band: 4.6 MHz .. 5.4 MHz, level: -50 dBFS }
    rate: 980 kHz
    filter: { family: butterworth, kind: bandpass, order: 4, corners: 4.1 MHz .. 4.6 MHz }
    limits: { alias: -60 dBFS, flatness: 1 dB }
`,
  );

describe('a rate that folds a band', () => {
  const folds = cured(echo(), 'wanted-folds');

  it('is moved near the middle of a window, and the title says its zone and which way round the band comes out', () => {
    const [first] = titles(folds);
    assert.match(first ?? '', /^Sample at [\d.]+ MHz \(zone \d+, (not )?inverted\): /);
    for (const fix of folds.cure.fixes) assert.deepEqual(errorsIn(after(folds, fix)), [], fix.title);
  });

  it('goes first to the window with the most room', () => {
    // Within a factor of 2: zones 5 (1.8 .. 2.1 MHz) to 14; zone 5 is by far the widest, its middle 1.95 MHz.
    assert.match(titles(folds)[0] ?? '', /^Sample at 1\.95 MHz \(zone 5, not inverted\)/);
  });

  it('is moved to the divisor that lies in a window, and says it', () => {
    const example = exampleText('echo-receiver').replace('divide: 20 }', 'divide: 21 }');
    assert.deepEqual(titles(cured(example, 'wanted-folds')), [
      'Sample at 1.024 MHz (÷20, zone 9, not inverted): headroom margin 2.1 dB',
    ]);
  });

  it('stays where none of the choices helps, and a note says so', () => {
    const none = cured(echo({ 'rate: 980 kHz': 'rate: 980 kHz\n    rate-choices: [970 kHz, 980 kHz, 990 kHz]' }), 'wanted-folds');
    assert.deepEqual(none.cure.fixes, []);
    assert.equal(none.cure.note, 'None of the `rate-choices` keeps the wanted band whole.');
  });

  it('stays where two bands lie on each other before they are sampled', () => {
    const both = echo({
      '{ band: 4.2 MHz .. 4.5 MHz, level: -6 dBFS }': '[{ band: 4.2 MHz .. 4.5 MHz }, { band: 4.4 MHz .. 4.6 MHz }]',
      '980 kHz': '12 MHz',
    });
    const none = cured(both, 'wanted-folds');
    assert.deepEqual(none.cure.fixes, []);
    assert.equal(none.cure.note, 'No rate keeps all wanted bands whole and apart.');
  });
});

describe('an alias limit of a band-sampled channel', () => {
  it('is met in the window that leaves it the largest margin', () => {
    // 900 kHz: zone 10 ends at 933 kHz, so the band all but touches its mirror.
    const near = cured(echo({ '980 kHz': '903 kHz' }), 'alias-over-limit');
    const rates = near.cure.fixes.filter(({ kind }) => kind === 'rate');
    const margins = rates.map(({ margin }) => margin ?? -Infinity);
    assert.ok(rates.length > 0, near.finding.message);
    assert.equal(margins[0], Math.max(...margins));
    for (const fix of rates) assert.deepEqual(errorsIn(after(near, fix)), [], fix.title);
  });

  it('is met by a narrower filter, whose corners are written as a range', () => {
    const wide = cured(
      echo({
        '980 kHz': '1.024 MHz\n    rate-choices: [1.024 MHz]',
        'corners: 4.1 MHz .. 4.6 MHz': 'corners: 4 MHz .. 4.7 MHz',
        'alias: -60 dBFS': 'alias: -54 dBFS',
        'flatness: 1 dB': 'flatness: 2 dB',
      }),
      'alias-over-limit',
    );
    const corner = wide.cure.fixes.find(({ kind }) => kind === 'corner');
    assert.match(
      corner?.title ?? '',
      /^Narrow the filter to 4\.\d+ MHz \.\. 4\.\d+ MHz: alias margin \d/,
      titles(wide).join('\n'),
    );
    assert.ok(corner !== undefined);
    assert.deepEqual(errorsIn(after(wide, corner)), []);
  });
});

describe('the windows to choose from', () => {
  const band = { wanted: [wanted(65e6, 75e6)], rate: rate(41e6) };

  it('are those within a factor of 2, the roomiest first, each with a rate of few figures near its middle', () => {
    const options = windowOptions(capture(band));
    assert.deepEqual(
      options.map(({ option }) => option.hz),
      // Zones 2 (75 .. 130), 3 (50 .. 65), 4 (37.5 .. 43.3), 5 (30 .. 32.5), 6 (25 .. 26) and 7 (21.43 .. 21.67 MHz).
      [103e6, 57.5e6, 40.4e6, 31.3e6, 25.5e6, 21.5e6],
    );
    const rooms = options.map(({ room }) => room);
    assert.deepEqual(
      rooms,
      [...rooms].sort((a, b) => b - a),
    );
  });

  it('take the allowed rate nearest to the middle where there are choices', () => {
    const list = { kind: 'list', ratesHz: [38e6, 40e6, 43e6, 55e6, 70e6] } as const;
    assert.deepEqual(
      windowOptions(capture({ ...band, rateChoices: list })).map(({ option }) => option.hz),
      [55e6, 40e6],
    );
  });

  it('are none for a band that only zone 1 holds', () => {
    assert.deepEqual(windowOptions(capture({ wanted: [wanted(5, 10e3)], rate: rate(51.2e3) })), []);
  });
});
