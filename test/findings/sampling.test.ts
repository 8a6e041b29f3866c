import assert from 'node:assert/strict';
import type { RateChoices } from '../../src/spec/channel';
import { bearing, found, messages } from '../support/found';
import { figures } from '../support/figures';
import { band, rate, wanted } from '../support/channel-builder';

describe('wanted-folds and wanted-touches', () => {
  const echo = bearing({ wanted: [wanted(1.2e6, 1.6e6)], rate: rate(1.4e6) });
  const at = { outputRate: 1.4e6 };

  it('names the multiple of half the rate that the band crosses', () => {
    const faults = [{ kind: 'wanted-folds', index: 0, onto: null, edgeHz: 1.4e6 }] as const;
    assert.deepEqual(messages('wanted-folds', echo, figures({ ...at, faults })), [
      'The wanted band 1.2 MHz .. 1.6 MHz crosses 1.4 MHz, the rate of 1.4 MHz, and folds onto itself. ' +
        'Rates of 1.067 MHz to 1.2 MHz (zone 3, not inverted) and of 1.6 MHz to 2.4 MHz (zone 2, inverted) keep it whole.',
    ]);
  });

  it('counts the guard to the band', () => {
    const faults = [{ kind: 'wanted-folds', index: 0, onto: null, edgeHz: 1.4e6 }] as const;
    const guarded = { ...echo, guardHz: 10e3 };
    assert.match(
      messages('wanted-folds', guarded, figures({ ...at, faults }))[0] ?? '',
      /1\.6 MHz with its guard of 10 kHz crosses/,
    );
  });

  it('names the other band where one lands on another', () => {
    const two = { ...echo, wanted: [wanted(100e3, 200e3, 0, 'near'), wanted(1.2e6, 1.3e6, 0, 'far')] };
    const faults = [{ kind: 'wanted-folds', index: 1, onto: 0, edgeHz: null }] as const;
    const [finding] = found('wanted-folds', two, figures({ ...at, faults }));
    assert.match(
      finding?.message ?? '',
      /^The wanted band `far`, .* comes out on top of the wanted band `near`, 100 kHz \.\. 200 kHz/,
    );
    assert.ok(finding?.related.some(({ place }) => place.path.join('.') === 'wanted.0.band'));
    assert.match(finding?.message ?? '', /Rates of .* \(zones 1 and \d\) .* keep all bands whole and apart\.$/);
  });

  it('says of two bands that leave in the same words what they are made of', () => {
    const two = { ...echo, direction: 'generate' as const, wanted: [wanted(100e3, 200e3), wanted(1.2e6, 1.3e6)] };
    const faults = [{ kind: 'wanted-folds', index: 1, onto: 0, edgeHz: null }] as const;
    assert.match(
      messages('wanted-folds', two, figures({ ...at, faults }))[0] ?? '',
      /is made by the same words as the wanted band/,
    );
  });

  it('says where no rate can help', () => {
    const two = { ...echo, wanted: [wanted(100e3, 200e3), wanted(150e3, 250e3)] };
    const faults = [{ kind: 'wanted-folds', index: 1, onto: 0, edgeHz: null }] as const;
    assert.match(messages('wanted-folds', two, figures({ ...at, faults }))[0] ?? '', /No rate keeps all bands whole and apart:/);
  });

  it('warns where the band only touches the edge, and says one thing at a time', () => {
    const faults = [{ kind: 'wanted-touches', index: 0, onto: null, edgeHz: 700e3 }] as const;
    assert.match(
      messages('wanted-touches', echo, figures({ ...at, faults }))[0] ?? '',
      /ends on 700 kHz, half the rate of 1\.4 MHz/,
    );
    assert.deepEqual(found('wanted-folds', echo, figures({ ...at, faults })), []);
    assert.deepEqual(found('wanted-touches', echo, figures(at)), []);
  });
});

describe('rate-unavailable', () => {
  const clock = { name: 'board', frequencyHz: 24.576e6, jitterSeconds: 0, multiply: 1, divide: 1 };
  const choices: Readonly<Record<string, RateChoices>> = {
    list: { kind: 'list', ratesHz: [48e3, 64e3] },
    range: { kind: 'range', lowHz: 48e3, highHz: 96e3, stepHz: null },
    steps: { kind: 'range', lowHz: 48e3, highHz: 96e3, stepHz: 16e3 },
    divides: { kind: 'clock', clock, divides: { from: 120, to: 512 } },
    'listed divides': { kind: 'clock', clock, divides: [384, 512] },
  };
  const sayings = (hz: number): Readonly<Record<string, readonly string[]>> =>
    Object.fromEntries(
      Object.entries(choices).map(([name, rateChoices]) => [
        name,
        messages('rate-unavailable', bearing({ rate: rate(hz), rateChoices }), figures()),
      ]),
    );

  it('is silent for a rate that every form of choice holds', () => {
    assert.deepEqual(Object.values(sayings(64e3)).flat(), []);
    assert.deepEqual(Object.values(sayings(48e3)).flat(), []);
  });

  it('names the nearest rates on both sides', () => {
    const near = (text: string): string => `The rate of 50 kHz is not among the \`rate-choices\`; the nearest ${text}.`;
    assert.deepEqual(sayings(50e3), {
      list: [near('are 48 kHz and 64 kHz')],
      range: [],
      steps: [near('are 48 kHz and 64 kHz')],
      // 24.576 MHz/492 and /491.
      divides: [near('are 49.95 kHz and 50.05 kHz')],
      'listed divides': [near('are 48 kHz and 64 kHz')],
    });
  });

  it('names one neighbour at the end of the choices', () => {
    assert.match(sayings(40e3)['range']?.[0] ?? '', /the nearest is 48 kHz/);
    assert.match(sayings(200e3)['steps']?.[0] ?? '', /the nearest is 96 kHz/);
  });

  it('has nothing to say without choices', () => {
    assert.deepEqual(found('rate-unavailable', bearing(), figures()), []);
  });
});

describe('overlaps-wanted', () => {
  it('names the stretch and stands on the source', () => {
    const channel = bearing({ unwanted: [band(9e3, 3e6, -55, 'drive hash')] });
    const [finding] = found(
      'overlaps-wanted',
      channel,
      figures({ overlaps: [{ index: 0, harmonic: 1, lowHz: 9e3, highHz: 10e3 }] }),
    );
    assert.match(finding?.message ?? '', /^`drive hash` lies inside the wanted band over 9 kHz \.\. 10 kHz\./);
    assert.deepEqual(finding?.at, { place: { channel: 'bearing-x', path: ['unwanted', 0, 'band'] } });
    assert.deepEqual(found('overlaps-wanted', channel, figures()), []);
  });

  it('says which harmonic it is', () => {
    const overlaps = [{ index: 0, harmonic: 3, lowHz: 6e3, highHz: 6e3 }];
    assert.match(
      messages('overlaps-wanted', bearing(), figures({ overlaps }))[0] ?? '',
      /^`drive hash`, harmonic 3 lies inside the wanted band at 6 kHz\./,
    );
  });
});

describe('what a channel leaves out', () => {
  it('is hinted at on its name', () => {
    for (const [code, channel] of [
      ['nothing-unwanted', bearing({ unwanted: [] })],
      ['no-limits', bearing()],
      ['no-filter', bearing({ stages: [] })],
    ] as const) {
      const [finding] = found(code, channel, figures());
      assert.equal(finding?.severity, 'hint', code);
      assert.deepEqual(finding.at, { place: { channel: 'bearing-x', path: [], part: 'key' } });
    }
  });

  it('is not hinted at where it is there', () => {
    assert.deepEqual(found('nothing-unwanted', bearing(), figures()), []);
    assert.deepEqual(found('no-filter', bearing(), figures()), []);
    assert.deepEqual(found('nothing-unwanted', { ...bearing({ unwanted: [] }), direction: 'generate' }, figures()), []);
  });
});
