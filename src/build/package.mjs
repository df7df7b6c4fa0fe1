// `npm run package`: the .vsix, in out/. Everything is bundled, so that it holds no node_modules.
import { mkdirSync, statSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { createVSIX } from '@vscode/vsce';

const root = join(dirname(fileURLToPath(import.meta.url)), '../..');
const target = join(root, 'out/tautline.vsix');

mkdirSync(dirname(target), { recursive: true });
await createVSIX({
  cwd: root,
  packagePath: target,
  dependencies: false,
  allowMissingRepository: true,
  rewriteRelativeLinks: false,
});
console.log(`out/tautline.vsix, ${Math.round(statSync(target).size / 1024)} kB
To install it: code --install-extension out/tautline.vsix`);
