// Headless Chromium as Debian packages it.
import { existsSync } from 'node:fs';
import process from 'node:process';
import { chromium } from 'playwright-core';

const PLACES = [process.env.CHROMIUM, '/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'];

export async function openBrowser() {
  const executablePath = PLACES.find(place => place && existsSync(place));
  if (executablePath === undefined) throw new Error('no Chromium: apt-get install -y chromium, or set CHROMIUM');
  return chromium.launch({
    executablePath,
    args: ['--no-sandbox', '--disable-gpu', '--no-first-run', '--disable-background-networking'],
  });
}

/** The address of a workbench with a folder open, the extension under development, and perhaps a test suite to run. */
export function workbenchAddress(port, { folder, extension, suite }) {
  const remote = path => `vscode-remote://127.0.0.1:${port}${path}`;
  const payload = [];
  if (extension !== undefined) payload.push(['extensionDevelopmentPath', remote(extension)]);
  if (suite !== undefined) payload.push(['extensionTestsPath', remote(suite)]);
  const query = new URLSearchParams({ folder, payload: JSON.stringify(payload) });
  return `http://127.0.0.1:${port}/?${query}`;
}
