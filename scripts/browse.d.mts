// The types of browse.mjs for the tests, which are TypeScript.
import type { Browser } from 'playwright-core';

export function browse(): Promise<Browser>;
