/** Reads whole small specs for tests of single parts: tree, decoding and resolving without slices. */
import assert from 'node:assert/strict';
import type { Channel } from '../../src/spec/channel';
import { decode } from '../../src/spec/decode';
import type { Decoded } from '../../src/spec/decode';
import { channel as channelShape } from '../../src/spec/declaration/channel';
import type { ChannelModel } from '../../src/spec/declaration/channel';
import { clocks } from '../../src/spec/declaration/clock';
import { masks } from '../../src/spec/declaration/mask';
import { sources } from '../../src/spec/declaration/source';
import { filters } from '../../src/spec/declaration/stage';
import type { Shape } from '../../src/spec/shape';
import type { TreeNode } from '../../src/spec/tree';
import { Resolver } from '../../src/spec/resolver';
import type { Resolution } from '../../src/spec/resolve/resolution';
import { parseSlice } from '../../src/spec/yaml-tree';

/** The tree of a text that has no syntax error. */
export function treeOf(text: string): TreeNode | null {
  const { tree, error } = parseSlice(text);
  assert.equal(error, null, text);
  return tree;
}

/** Decodes a text against a shape. */
export function decodeText<T>(shape: Shape<T>, text: string): Decoded<T> {
  return decode(shape, treeOf(text), { span: { start: 0, end: 0 }, called: 'the value' });
}

/** The faults of a decoded text as "code: the text at their span". */
export function faultsOf(shape: Shape<unknown>, text: string): readonly string[] {
  return decodeText(shape, text).problems.map(({ code, span }) => `${code}: ${text.slice(span.start, span.end)}`);
}

/** Resolves one channel of a spec, given as text from `clocks:` to `channels:`. */
export function resolveText(text: string, name: string): Resolution {
  const tree = treeOf(text);
  const sections = new Map(tree?.form === 'map' ? tree.pairs.map(({ key, value }) => [key, value]) : []);
  const home = { span: { start: 0, end: 0 }, called: 'the section' };
  const section = <T>(shape: Shape<T>, key: string) =>
    sections.get(key) ? decode(shape, sections.get(key) ?? null, home).value : null;
  const knownClocks = section(clocks, 'clocks') ?? new Map<string, null>();
  const knownFilters = section(filters, 'filters') ?? new Map<string, null>();
  const knownSources = section(sources, 'sources') ?? new Map<string, null>();
  const knownMasks = section(masks, 'masks') ?? new Map<string, null>();
  const own = new Map<string, Decoded<ChannelModel>>();
  const map = sections.get('channels');
  for (const pair of map?.form === 'map' ? map.pairs : [])
    own.set(pair.key, decode(channelShape, pair.value, { ...home, called: `\`${pair.key}\`` }));
  const resolver = new Resolver(
    {
      channel: (known) => own.get(known),
      clock: (known) => knownClocks.get(known),
      filter: (known) => knownFilters.get(known),
      source: (known) => knownSources.get(known),
      mask: (known) => knownMasks.get(known),
      table: () => null,
      fileOf: () => null,
      lists: {
        channels: [...own.keys()],
        clocks: [...knownClocks.keys()],
        filters: [...knownFilters.keys()],
        sources: [...knownSources.keys()],
        masks: [...knownMasks.keys()],
      },
    },
    new Map(),
    // How a channel resolves is looked at here, computed or not.
    (resolved) => resolved,
  );
  const resolution = resolver.resolve(name);
  assert.ok(resolution);
  return resolution;
}

/** The whole channel of a spec without faults. */
export function wholeChannel(text: string, name: string): Channel {
  const { channel, problems } = resolveText(text, name);
  assert.deepEqual(problems, []);
  assert.ok(channel, 'the channel is not whole');
  return channel;
}

/** The faults that resolving finds as "code at path". */
export function resolveFaults(text: string, name: string): readonly string[] {
  return resolveText(text, name).problems.map(
    ({ code, path, part }) => `${code} at ${path.join('.')}${part === 'key' ? ' (key)' : ''}`,
  );
}
