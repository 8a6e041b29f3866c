/** Tests of the declaration as a whole: complete, in prose, and free of contradictions. */
import assert from 'node:assert/strict';
import { channel } from '../../../src/spec/declaration/channel';
import { limits } from '../../../src/spec/declaration/limits';
import { source } from '../../../src/spec/declaration/source';
import { stage } from '../../../src/spec/declaration/stage';
import { declaration } from '../../../src/spec/declaration/top-level';
import type { Fields, Key, Shape } from '../../../src/spec/shape';

function fieldsOf(shape: Shape<unknown>): Fields {
  assert.ok(shape.map && 'fields' in shape.map);
  return shape.map;
}

/** Every map with known keys that the declaration leads to. */
function* maps(shape: Shape<unknown>): Generator<Fields> {
  if (shape.list) yield* maps(shape.list.each);
  if (!shape.map) return;
  if (!('fields' in shape.map)) yield* maps(shape.map.each);
  else {
    yield shape.map;
    for (const key of Object.values(shape.map.fields)) yield* maps(key.shape);
  }
}

const now = (map: Fields) =>
  Object.entries(map.fields)
    .filter(([, key]) => key.later !== true)
    .map(([name]) => name)
    .sort();

const companions = (key: Key) => [...(key.with ?? []), ...(key.notWith ?? []), ...(key.requiredWith ?? [])];

const keys = (map: Fields) => Object.keys(map.fields).sort();

// The tables of the language's own description, as words.
const table = (words: string) => words.trim().split(/\s+/).sort();

describe('the declaration', () => {
  it('holds every key at the top of a file', () => {
    assert.deepEqual(keys(fieldsOf(declaration)), table('bandkeep title notes use clocks sources filters masks channels'));
    assert.deepEqual(now(fieldsOf(declaration)), table('bandkeep title notes use clocks sources filters masks channels'));
  });

  it('holds every key of a channel', () => {
    const all = `direction like wanted guard levels-at reference unwanted protect full-scale impedance rate rate-choices aperture hold gate
      filter input-filter output-filter test-tone jitter bits converter acquire differential decimate interpolate correct slots
      temperature worst-case limits ref`;
    assert.deepEqual(keys(fieldsOf(channel)), table(all));
    const computed = `direction like wanted guard levels-at reference unwanted protect full-scale impedance rate rate-choices aperture
      hold gate filter input-filter output-filter slots test-tone jitter bits limits ref`;
    assert.deepEqual(now(fieldsOf(channel)), table(computed));
  });

  it('holds every limit', () => {
    const all = `alias image flatness delay delay-spread level response through output snr sinad enob noise spur headroom settling crosstalk`;
    assert.deepEqual(keys(fieldsOf(limits)), table(all));
    assert.deepEqual(
      now(fieldsOf(limits)),
      table('alias image flatness delay delay-spread level response through output snr headroom crosstalk'),
    );
  });

  it('holds every key of a source and of a stage', () => {
    assert.deepEqual(
      keys(fieldsOf(source)),
      table('name tone band noise spectrum anything level power harmonics enters lines ref'),
    );
    const all = `name family order corner ripple corner-at rc bandwidth tolerance second-order cr rlc sallen-key multiple-feedback ladder
      poles zeros measured kind corners attenuation gain gain-at source load below beyond amplifier noise flicker build`;
    assert.deepEqual(keys(fieldsOf(stage)), table(all));
    const later = (map: Fields) => keys(map).filter((name) => map.fields[name]?.later === true);
    assert.deepEqual(later(fieldsOf(source)), table('noise power'));
    assert.deepEqual(later(fieldsOf(stage)), table('sallen-key multiple-feedback ladder amplifier noise flicker build'));
  });

  it('says of every key and word what it means, in a sentence', () => {
    for (const { fields } of maps(declaration)) {
      for (const [name, { about, shape }] of Object.entries(fields)) {
        const words = Object.entries({ ...shape.scalar?.words, ...shape.scalar?.laterWords });
        for (const [of, prose] of [[name, about], ...words] as const) assert.match(prose, /^[A-Z`1].*[.`]$/s, of);
      }
    }
  });

  it('names only keys and words that exist in its rules', () => {
    for (const map of maps(declaration)) {
      const words = Object.values(map.fields).flatMap((key: Key) => Object.keys(key.shape.scalar?.words ?? {}));
      const known = new Set([...Object.keys(map.fields), ...words]);
      const named = [...(map.decidedBy ?? []), ...Object.values(map.fields).flatMap(companions)];
      for (const name of named) assert.ok(known.has(name), `${map.called}: ${name}`);
      if (map.completedBy !== undefined) assert.ok(known.has(map.completedBy));
    }
  });
});
