/** Resolves where a source enters, and its harmonics. */
import type { Entrance, Harmonics } from '../channel';
import type { SourceModel } from '../declaration/source';
import { nearest } from '../nearest';
import type { Path } from '../place';
import { scalarText } from '../scalar-text';
import type { SourceContext } from './source-context';

/** Where a source enters, or null where there is no such place. */
export function resolveEntrance(
  stated: SourceModel['enters'],
  path: Path,
  { inputStages, outputStages, report }: SourceContext,
): Entrance | null {
  if (stated === undefined) return 'input';
  if (stated === null || inputStages === null) return null;
  if (stated === 'input' || stated === 'sampler') return stated;
  const index = inputStages.findIndex(({ name }) => name === stated);
  if (index >= 0) return { stage: index };
  if (outputStages?.some(({ name }) => name === stated) === true) {
    return report.fault(path, 'contradiction', `\`${stated}\` stands behind the sampler: what enters there is never sampled`);
  }
  const known = inputStages.flatMap(({ name }) => name ?? []);
  const meant = nearest(stated, [...known, 'input', 'sampler']);
  const said = `no stage of this path has the name \`${stated}\``;
  if (meant === null)
    return report.fault(
      path,
      'unknown-name',
      `${said}: a source enters at \`input\`, \`sampler\` or in front of a stage with a \`name\``,
    );
  return report.fault(path, 'unknown-name', `${said}; did you mean \`${meant}\`?`, scalarText(meant));
}

/** A square wave's harmonics fall as 1/m. */
const usualSlope = -20;

/** Harmonics in short and long form; null for none, undefined where they are faulty. */
export function resolveHarmonics(stated: SourceModel['harmonics']): Harmonics | null | undefined {
  if (stated === undefined) return null;
  if (stated === null) return undefined;
  if (typeof stated === 'number') return { to: stated, slopeDbPerDecade: usualSlope, odd: false };
  const { to, slope, odd } = stated;
  if (!to || slope === null || odd === null) return undefined;
  return { to, slopeDbPerDecade: slope?.value ?? usualSlope, odd: odd === 'true' };
}
