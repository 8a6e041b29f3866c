// The types of scratch-folder.mjs for the tests, which are TypeScript.
export function scratchFolder(name: string): string;
