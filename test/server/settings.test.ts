// The settings of the manifest are those of the table, and what a client sends is taken with care.
import { expect, test } from 'vitest';
import manifest from '../../package.json';
import { DEFAULT_SETTINGS, readSettings, SETTINGS } from '../../src/server/settings.ts';

test('the manifest declares the settings of the table', () => {
  const wanted = Object.entries(SETTINGS).map(([name, setting]) => [
    `tautline.${name}`,
    { type: 'boolean', ...setting },
  ]);
  expect(manifest.contributes.configuration.properties).toEqual(Object.fromEntries(wanted));
});

test('what has the wrong kind keeps its default', () => {
  expect(readSettings({ valuesInText: false, drawingsInHovers: 'yes' })).toEqual({
    valuesInText: false,
    drawingsInHovers: true,
  });
  expect(readSettings(null)).toEqual(DEFAULT_SETTINGS);
});

test('the extension wakes for Markdown only, works untrusted, and every direct dependency is pinned', () => {
  expect(manifest.activationEvents).toEqual(['onLanguage:markdown']);
  expect(manifest.capabilities.untrustedWorkspaces.supported).toBe(true);
  for (const version of Object.values(manifest.devDependencies)) expect(version).toMatch(/^\d+\.\d+\.\d+$/);
  expect(manifest).not.toHaveProperty('dependencies');
});
