import assert from 'node:assert/strict';
import { createJudgeStore, judge, type Judgement } from '../../src/findings';
import { read } from '../../src/spec';
import { bearingSpec } from '../support/whole-file';

const source = '      - { name: drive hash, band: 40 kHz .. 3 MHz, level: -55 dBFS }\n';
const above = (comment: string): string => bearingSpec.replace(source, `      ${comment}\n${source}`);
const judged = (text: string): Judgement => judge(read(text), createJudgeStore());
const codes = (text: string): readonly string[] =>
  judged(text).findings.map(({ code, accepted }) => `${code}${accepted === null ? '' : ', accepted'}`);

describe('an acceptance', () => {
  it('accepts from the line above and from the end of the line, with its reason', () => {
    const comment = '# bandkeep: accept alias-over-limit, the drive is off while we listen';
    for (const text of [above(comment), bearingSpec.replace(source, source.replace('\n', ` ${comment}\n`))]) {
      const [finding] = judged(text).findings;
      assert.equal(finding?.code, 'alias-over-limit');
      assert.equal(finding.accepted?.reason, 'the drive is off while we listen');
      assert.equal(text.slice(finding.accepted.span.start, finding.accepted.span.end), comment);
    }
  });

  it('lets the channel pass, and changes nothing about the limit', () => {
    const { channels } = judged(above('# bandkeep: accept alias-over-limit, agreed'));
    const limits = channels[0]?.figures?.limits;
    assert.equal(channels[0]?.passes, true);
    assert.equal(limits?.[0]?.passes, false);
  });

  it('holds down to its bound and lapses below it', () => {
    assert.deepEqual(codes(above('# bandkeep: accept alias-over-limit down to -4.9 dB, agreed')), ['alias-over-limit, accepted']);
    const lapsed = above('# bandkeep: accept alias-over-limit down to -4.7 dB, agreed');
    assert.deepEqual(codes(lapsed), ['alias-over-limit']);
    assert.match(
      judged(lapsed).findings[0]?.message ?? '',
      /accepted down to a margin of −4\.7 dB \(agreed\), which it no longer keeps\.$/,
    );
    assert.equal(judged(lapsed).channels[0]?.passes, false);
  });

  it('of a time has a bound that is a time', () => {
    const late = (bound: string): string =>
      bearingSpec.replace('flatness: 0.8 dB', `delay: 30 µs # bandkeep: accept delay-over-limit down to ${bound}, agreed`);
    const delays = (text: string) => judged(text).findings.filter(({ code }) => code === 'delay-over-limit');
    assert.equal(delays(late('-2 µs'))[0]?.accepted?.downTo, -2e-6);
    const [lapsed] = delays(late('-1 µs'));
    assert.equal(lapsed?.accepted, null);
    assert.match(lapsed.message, /accepted down to a margin of −1 µs \(agreed\), which it no longer keeps\.$/);
    const [other] = delays(late('-2 dB'));
    assert.equal(other?.accepted, null);
    assert.match(other.message, /accepted down to a margin of −2 dB \(agreed\), but its margin is a time\.$/);
  });

  it('of a finding that is not on its line is stale', () => {
    const elsewhere = bearingSpec.replace('    bits: 16\n', '    # bandkeep: accept alias-over-limit, agreed\n    bits: 16\n');
    assert.deepEqual(codes(elsewhere), ['alias-over-limit', 'stale-acceptance']);
    assert.deepEqual(codes(above('# bandkeep: accept flatness-over-limit, agreed')), ['stale-acceptance', 'alias-over-limit']);
  });

  it('is not called stale while its channel cannot be judged', () => {
    const broken = above('# bandkeep: accept alias-over-limit, agreed').replace('bits: 16', 'bits: many');
    assert.ok(!codes(broken).includes('stale-acceptance'));
  });

  it('cannot accept a fault of the text, nor itself', () => {
    const fault = bearingSpec.replace('    bits: 16\n', '    bitz: 16 # bandkeep: accept unknown-key, we like it\n');
    const { findings } = judged(fault);
    assert.ok(findings.some(({ code, accepted }) => code === 'unknown-key' && accepted === null));
    assert.match(findings.find(({ code }) => code === 'stale-acceptance')?.message ?? '', /^`unknown-key` cannot be accepted/);
    assert.match(
      judged(above('# bandkeep: accept stale-acceptance, no')).findings[0]?.message ?? '',
      /^`stale-acceptance` cannot be accepted/,
    );
  });

  it('accepts hints and warnings as well', () => {
    const silent = bearingSpec
      .replace('  bearing-x:\n', '  bearing-x: # bandkeep: accept no-limits, figures only\n')
      .replace(/ {4}limits:[^]*$/u, '');
    assert.deepEqual(codes(silent), ['no-limits, accepted']);
  });
});
