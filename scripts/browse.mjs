// Starts the browser that the tests look through.
import { findBrowser } from './find-browser.mjs';

/** A headless browser, driven by playwright. */
export async function browse() {
  const { chromium } = await import('playwright-core');
  const { executablePath, args } = await findBrowser();
  return chromium.launch({ executablePath, args, headless: true });
}
