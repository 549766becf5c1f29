import { existsSync } from 'node:fs';
import chromium from '@sparticuz/chromium';
import { type Browser, chromium as launcher } from 'playwright-core';

/** A browser that makes no request of its own. */
const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-default-apps',
  '--disable-sync',
  '--no-first-run',
  '--no-proxy-server',
  '--font-render-hinting=none',
];

let found: Promise<string> | null = null;

/** The browser to test with: CHROMIUM_PATH, an installed one, or the one that the development packages carry. */
export function browserPath(): Promise<string> {
  // Asked once: two first extractions at a time would write the same file.
  found ??= locate();
  return found;
}

async function locate(): Promise<string> {
  const named = process.env['CHROMIUM_PATH'];
  if (named) return named;
  if (existsSync('/usr/bin/chromium')) return '/usr/bin/chromium';
  return chromium.executablePath();
}

/** Opens a headless browser. */
export async function openBrowser(): Promise<Browser> {
  return launcher.launch({ executablePath: await browserPath(), args: FLAGS, headless: true });
}
