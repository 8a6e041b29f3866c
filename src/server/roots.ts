/** From a spec's URI to the folder that the paths in it may not leave, and from a path there to a URI. */

/**
 * One spelling for all URIs of the same file, decoded: clients differ in what they encode and in how they write a drive letter. Only
 * for comparing and for joining; `encoded` makes a URI of it again.
 */
export function plainSpelling(uri: string): string {
  return decoded(uri).replace(/^(file:\/\/\/)([A-Z])(?=:)/, (_whole, head: string, drive: string) => head + drive.toLowerCase());
}

/** A plain spelling as a URI. */
export function encoded(plain: string): string {
  const [, head = '', path = ''] = /^([a-z][a-z0-9+.-]*:(?:\/\/[^/]*)?)?(.*)$/is.exec(plain) ?? [];
  return head + path.split('/').map(encodeURIComponent).join('/');
}

/** The folder in which a spec's files must lie, ending in `/`: the innermost workspace folder that holds it, else its own. */
export function rootOf(uri: string, folders: readonly string[]): string {
  const plain = plainSpelling(uri);
  const holding = folders
    .map((folder) => plainSpelling(folder).replace(/\/*$/, '/'))
    .filter((folder) => plain.startsWith(folder))
    .sort((a, b) => b.length - a.length);
  return holding[0] ?? plain.slice(0, plain.lastIndexOf('/') + 1);
}

function decoded(uri: string): string {
  try {
    return decodeURIComponent(uri);
  } catch {
    return uri;
  }
}
