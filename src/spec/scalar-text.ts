/** Writes a text as a scalar that reads back as that text, inside brackets too: quoted only where it must be. */

/** The text as it may stand in a spec. */
export function scalarText(text: string): string {
  return isPlain(text) ? text : `'${text.replace(/'/g, "''")}'`;
}

function isPlain(text: string): boolean {
  if (text === '' || text !== text.trim()) return false;
  if (/^[-?:,[\]{}#&*!|>'"%@`]/.test(text) && !/^-[^\s,[\]{}]/.test(text)) return false;
  return !/[,[\]{}\n]|:(?:\s|$)|\s#/.test(text);
}
