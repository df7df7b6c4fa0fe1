// The second road proves something only as long as it shares nothing with the first but the model.
import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { expect, test } from 'vitest';

const room = fileURLToPath(new URL('../../src/virtual-work/', import.meta.url));

test('virtual work imports from itself and from the model only', () => {
  for (const file of readdirSync(room)) {
    const imports = readFileSync(room + file, 'utf8').matchAll(/from '([^']+)'/g);
    for (const [, path] of imports)
      expect(path, file).toMatch(/^(\.\/|\.\.\/model\/(structure|question|gravity)\.ts$)/);
  }
});
