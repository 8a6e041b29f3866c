/** The names of stages that a source may enter in front of. */
import { insideOf } from '../inside';
import type { Reading } from '../reading';
import type { MapNode, TreeNode } from '../tree';

/** The stages in front of the sampler that have a name, in a channel's own filter or in the one that it names. */
export function stageNames(reading: Reading, channel: MapNode | null): readonly string[] {
  const filters = channel?.pairs.filter(({ key }) => key === 'filter' || key === 'input-filter') ?? [];
  return filters.flatMap(({ value }) => namesIn(throughName(reading, value)));
}

function throughName(reading: Reading, node: TreeNode | null): TreeNode | null {
  if (node?.form !== 'scalar') return node;
  return insideOf(reading).names.filters.get(node.text)?.named.pair.value ?? null;
}

function namesIn(node: TreeNode | null): readonly string[] {
  const stages = node?.form === 'list' ? node.items : [node];
  return stages.flatMap((stage) => {
    const name = stage?.form === 'map' ? stage.pairs.find(({ key }) => key === 'name')?.value : null;
    return name?.form === 'scalar' ? [name.text] : [];
  });
}
