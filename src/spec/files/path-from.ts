/** Turns a path as a spec writes it into one from the root, and refuses what leads out of it. */

/** A path from the root, or why there is none, with one that may have been meant. */
export type PathReading = { readonly path: string } | { readonly fault: string; readonly meant: string | null };

/**
 * Resolves a path.
 * @param file the spec's own path from the root, with `/`
 * @param written the path as it stands in the spec, relative to the spec's folder
 */
export function pathFrom(file: string, written: string): PathReading {
  if (written === '') return { fault: 'the path is empty', meant: null };
  if (/^[a-z][a-z+.-]*:\/\//i.test(written))
    return { fault: `\`${written}\` is an address: a spec names files by their path`, meant: null };
  if (/^(?:[/\\~]|[a-z]:)/i.test(written)) {
    return { fault: `\`${written}\` is an absolute path: write it relative to the folder of this spec`, meant: null };
  }
  if (written.includes('\\'))
    return { fault: `\`${written}\`: folders are parted by \`/\``, meant: written.replaceAll('\\', '/') };
  const steps = file.split('/').slice(0, -1);
  for (const step of written.split('/')) {
    if (step === '' || step === '.') continue;
    if (step !== '..') steps.push(step);
    else if ((steps.pop() ?? '..') === '..') return outOfRoot(written);
  }
  // A spec that lies outside the root itself has nothing beside it that may be named.
  if (steps[0] === '..') return outOfRoot(written);
  return steps.length === 0 ? { fault: `\`${written}\` names a folder`, meant: null } : { path: steps.join('/') };
}

const outOfRoot = (written: string): PathReading => ({
  fault: `\`${written}\` leads out of the root, where no file may be named`,
  meant: null,
});
