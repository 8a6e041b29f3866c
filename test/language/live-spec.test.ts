/** An open spec over its versions: what an edit costs, and which proofs it leaves standing. */
import assert from 'node:assert/strict';
import { drain } from '../../src/jobs';
import { openSpec, unproved, type LiveSpec, type SpecDocument } from '../../src/language';
import { manyChannels } from '../support/spec-texts';

/** Three channels that all break their alias limit. */
const broken = manyChannels(3).replaceAll('level: -40 dBFS', 'level: 0 dBFS').replaceAll('alias: -80', 'alias: -140');

function proved(spec: LiveSpec): SpecDocument {
  const document = drain(spec.judging());
  for (const finding of unproved(document)) drain(spec.curing(document, finding));
  return document;
}

function changed(spec: LiveSpec, text: string): SpecDocument {
  spec.change(spec.version + 1, text);
  return drain(spec.judging());
}

describe('an open spec', () => {
  it('has no document until its newest text is judged', () => {
    const spec = openSpec('file:///a', 1, broken);
    assert.equal(spec.document, null);
    const document = drain(spec.judging());
    assert.equal(spec.document, document);
    spec.change(2, `${broken}\n`);
    assert.equal(spec.document, null);
  });

  it('keeps the proofs of channels that an edit leaves alone', () => {
    const spec = openSpec('file:///a', 1, broken);
    const before = proved(spec);
    assert.equal(unproved(before).length, 0);
    const curable = before.judgement.findings.filter((finding) => before.cureOf(finding) !== null).length;
    assert.equal(curable, 3);
    const after = changed(spec, broken.replace('alias: -140', 'alias: -141'));
    assert.equal(unproved(after).length, 1);
  });

  it('moves the edits of kept fixes with their lines', () => {
    const spec = openSpec('file:///a', 1, broken);
    proved(spec);
    const line = '\nnotes: A line more.';
    const after = changed(spec, broken.replace('title: Many gauges', `title: Many gauges${line}`));
    assert.equal(unproved(after).length, 0);
    for (const finding of after.judgement.findings) {
      for (const { edits } of after.cureOf(finding)?.fixes ?? []) {
        for (const { span } of edits) {
          assert.equal(
            after.reading.text.slice(span.start, span.end),
            broken.slice(span.start - line.length, span.end - line.length),
          );
        }
      }
    }
  });

  it('drops a kept fix that would now reach a channel it was not proved on', () => {
    const spec = openSpec('file:///a', 1, broken);
    proved(spec);
    const after = changed(spec, `${broken}\n  copy:\n    like: gauge-0\n    limits: { flatness: 0.000001 dB }\n`);
    const first = after.judgement.findings.find(({ code, channel }) => code === 'alias-over-limit' && channel === 'gauge-0');
    assert.ok(first);
    assert.equal(after.cureOf(first), null);
    const last = after.judgement.findings.find(({ code, channel }) => code === 'alias-over-limit' && channel === 'gauge-2');
    assert.ok(last);
    assert.notEqual(after.cureOf(last), null);
  });

  it('gives nothing but its own work in the counts', () => {
    const spec = openSpec('file:///a', 1, manyChannels(40));
    drain(spec.judging());
    assert.equal(spec.counts?.channelsAnalysed, 40);
    changed(spec, manyChannels(40).replace('bits: 16', 'bits: 18'));
    assert.equal(spec.counts.channelsAnalysed, 1);
    assert.equal(spec.counts.slicesRead, 1);
  });

  it('is read and judged anew when a file that it leans on has changed, and only what that changes', () => {
    const table = (levelDb: number) => `frequency (kHz),level (dBFS)\n30,${levelDb}\n3000,${levelDb}\n`;
    const texts = new Map([['t.csv', table(-20)]]);
    const content = (path: string) => {
      const text = texts.get(path);
      return text === undefined ? null : { text };
    };
    const text = `${manyChannels(3)}  tabled:\n    like: gauge-0\n    unwanted: { name: hash, spectrum: t.csv }\n`;
    const spec = openSpec('file:///a', 1, text, { path: 'a.bandkeep.yaml', content });
    assert.deepEqual(spec.read(), ['t.csv']);
    const levelIn = (document: SpecDocument) =>
      document.judgement.channels.find(({ entry }) => entry.name === 'tabled')?.figures?.alias?.level ?? NaN;
    const before = levelIn(drain(spec.judging()));
    texts.set('t.csv', table(-30));
    spec.refresh();
    assert.equal(spec.document, null);
    assert.ok(Math.abs(levelIn(drain(spec.judging())) - (before - 10)) < 1e-9);
    assert.equal(spec.counts?.channelsAnalysed, 1);
    assert.equal(spec.version, 1);
  });
});
