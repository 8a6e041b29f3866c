/** The order in which fixes are proved, with a clock that makes every slice one step. */
import assert from 'node:assert/strict';
import { createOpenSpecs, type OpenSpecs } from '../../src/server/open-specs';
import type { Platform } from '../../src/server/platform';
import { Proofs } from '../../src/server/proofs';
import type { SpecDocument } from '../../src/language';
import { manyChannels } from '../support/spec-texts';

/** Four channels that all break their alias limit. */
const broken = manyChannels(4).replaceAll('level: -40 dBFS', 'level: 0 dBFS').replaceAll('alias: -80', 'alias: -140');
const uri = 'file:///lagoon/many.bandkeep.yaml';

interface Bench {
  readonly specs: OpenSpecs;
  readonly proofs: Proofs;
  readonly faults: unknown[];
  readonly judged: () => Promise<SpecDocument>;
  /** Lets the others have turns until the condition holds. */
  readonly until: (condition: () => boolean) => Promise<void>;
}

function bench(): Bench {
  let time = 0;
  const platform: Platform = {
    version: 'test',
    now: () => (time += 100),
    loadFile: null,
    yieldControl: () => new Promise((resolve) => setImmediate(resolve)),
  };
  const specs = createOpenSpecs(platform);
  const faults: unknown[] = [];
  specs.change(uri, 1, broken);
  return {
    specs,
    proofs: new Proofs(specs, platform, (fault) => faults.push(fault)),
    faults,
    judged: async () => {
      const document = await specs.judged(uri);
      assert.ok(document);
      return document;
    },
    until: async (condition) => {
      for (let turn = 0; !condition(); turn += 1) {
        if (turn > 100_000) throw new Error('It never came to that.');
        await platform.yieldControl();
      }
    },
  };
}

const aliases = (document: SpecDocument) => document.judgement.findings.filter(({ code }) => code === 'alias-over-limit');
const provedIn = (document: SpecDocument): (string | null)[] =>
  aliases(document).flatMap((finding) => (document.hasCure(finding) ? [finding.channel] : []));

describe('proofs in the background', () => {
  it('come to every finding', async () => {
    const { proofs, judged, until, faults } = bench();
    const document = await judged();
    proofs.wake();
    await until(() => provedIn(document).length === 4);
    assert.deepEqual(faults, []);
  });

  it('begin with the channel last looked at', async () => {
    const { proofs, judged, until } = bench();
    const document = await judged();
    const line = broken.split('\n').findIndex((text) => text.startsWith('  gauge-2:')) + 4;
    proofs.lookAt(uri, { line, character: 10 });
    proofs.wake();
    await until(() => provedIn(document).length > 0);
    assert.deepEqual(provedIn(document), ['gauge-2']);
  });

  it('make way for what a request waits for', async () => {
    const { proofs, judged } = bench();
    const document = await judged();
    proofs.wake();
    const last = aliases(document).at(-1);
    assert.ok(last);
    await proofs.prove(document, [last], () => false);
    assert.deepEqual(provedIn(document), ['gauge-3']);
  });

  it('go on after a request has been served', async () => {
    const { proofs, judged, until } = bench();
    const document = await judged();
    await proofs.prove(document, aliases(document).slice(3), () => false);
    await until(() => provedIn(document).length === 4);
  });

  it('end for a request that is cancelled, with what is proved by then', async () => {
    const { proofs, judged } = bench();
    const document = await judged();
    await proofs.prove(document, aliases(document), () => provedIn(document).length > 0);
    assert.equal(provedIn(document).length, 1);
  });

  it('are made once for two requests that wait for the same', async () => {
    const { specs, proofs, judged } = bench();
    const document = await judged();
    const [first] = aliases(document);
    assert.ok(first);
    const spec = specs.get(uri);
    assert.ok(spec);
    let begun = 0;
    const curing = spec.curing.bind(spec);
    Object.assign(spec, {
      curing: (...args: Parameters<typeof curing>) => {
        begun += args[1] === first ? 1 : 0;
        return curing(...args);
      },
    });
    await Promise.all([proofs.prove(document, [first], () => false), proofs.prove(document, [first], () => false)]);
    assert.equal(begun, 1);
  });

  it('are dropped when a newer version comes', async () => {
    const { specs, proofs, judged } = bench();
    const document = await judged();
    const proving = proofs.prove(document, aliases(document), () => false);
    specs.change(uri, 2, broken.replace('title: Many', 'title: Some'));
    await proving;
    assert.equal(specs.isNewest(document), false);
    assert.deepEqual(provedIn(document), []);
  });

  it('report a search that fails, and go on with the next', async () => {
    const { specs, proofs, judged, until, faults } = bench();
    const document = await judged();
    const spec = specs.get(uri);
    assert.ok(spec);
    const curing = spec.curing.bind(spec);
    Object.assign(spec, {
      curing: (...args: Parameters<typeof curing>) => {
        if (args[1].channel === 'gauge-1') throw new Error('inner fault');
        return curing(...args);
      },
    });
    proofs.wake();
    await until(() => provedIn(document).length === 3);
    assert.equal(faults.length, 1);
    assert.deepEqual(provedIn(document), ['gauge-0', 'gauge-2', 'gauge-3']);
  });
});
