// `node test/bench/run.mjs keystroke|start`: measurements whose figures stand in DEVELOPERS.md. Each is a ratio to a
// floor that is measured in the same run, alternating, since a shared machine is never equally fast twice.
import process from 'node:process';

const BENCHES = {
  keystroke: () => import('./keystroke.mjs'),
  start: () => import('./start.mjs'),
};

const [name = ''] = process.argv.slice(2);
if (!Object.hasOwn(BENCHES, name))
  throw new Error(`no bench is named "${name}"; there are ${Object.keys(BENCHES).join(', ')}`);
await BENCHES[name]();
