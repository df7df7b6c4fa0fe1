// How the factorisation compares with scipy's on the same matrices, one run of each in turn, so that both meet the same
// minutes of a busy machine. Times hold everything from the matrix to the solution: ordering, plan, numbers, substitution.
//
//   node test/bench/factorisation.bench.ts     (needs Debian's python3-scipy for /usr/bin/python3)

import { spawn } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { factorise } from '../../src/mechanics/factorisation.ts';
import type { SymmetricMatrix } from '../../src/mechanics/symmetric-matrix.ts';
import { gridFrame } from './grid-frame.ts';

const frames = [
  { storeys: 10, columns: 10, pairs: 201, warmUp: 400 },
  { storeys: 32, columns: 31, pairs: 61, warmUp: 60 },
  { storeys: 100, columns: 100, pairs: 15, warmUp: 8 },
];
const methods = ['spsolve', 'MMD_AT_PLUS_A'];

console.log('freedoms  first ms   own ms   scipy                scipy ms   own/scipy  (quartiles)     difference');
for (const { storeys, columns, pairs, warmUp } of frames) {
  const matrix = gridFrame(storeys, columns);
  const rhs = Float64Array.from({ length: matrix.size }, (_, freedom) => [3e3, -2e4, 0][freedom % 3]!);
  const [first] = timed(() => factorise(matrix).solve(rhs));
  for (let k = 0; k < warmUp; k++) factorise(matrix).solve(rhs);
  for (const method of methods) {
    const scipy = await startScipy(matrix, rhs);
    for (let k = 0; k < 3; k++) await scipy.seconds(method);
    const own: number[] = [];
    const theirs: number[] = [];
    let solution: Float64Array = rhs;
    for (let k = 0; k < pairs; k++) {
      const [milliseconds, x] = timed(() => factorise(matrix).solve(rhs));
      own.push(milliseconds);
      solution = x;
      theirs.push(1000 * (await scipy.seconds(method)));
    }
    const ratios = own.map((milliseconds, k) => milliseconds / theirs[k]!);
    console.log(
      [
        String(matrix.size).padStart(8),
        first.toFixed(2).padStart(9),
        quantile(own, 0.5).toFixed(3).padStart(9),
        `  ${method.padEnd(14)}`,
        quantile(theirs, 0.5).toFixed(3).padStart(14),
        quantile(ratios, 0.5).toFixed(2).padStart(11),
        `(${quantile(ratios, 0.25).toFixed(2)}-${quantile(ratios, 0.75).toFixed(2)})`.padStart(14),
        difference(solution, scipy.solution()).toExponential(1).padStart(14),
      ].join(' '),
    );
    scipy.stop();
  }
}

/** A scipy that holds the matrix and solves on demand. */
async function startScipy(matrix: SymmetricMatrix, rhs: Float64Array) {
  const folder = mkdtempSync(join(tmpdir(), 'factorisation-'));
  const source = join(folder, 'matrix');
  const target = join(folder, 'solution');
  const parts = [Int32Array.of(matrix.size, matrix.rows.length), matrix.starts, matrix.rows, matrix.values, rhs];
  writeFileSync(source, Buffer.concat(parts.map(part => Buffer.from(part.buffer, part.byteOffset, part.byteLength))));
  // Where a machine pins OpenBLAS to a kernel, it does so by these two together; here scipy is left to choose.
  const { OPENBLAS_CORETYPE: _kernel, OPENBLAS_L2_SIZE: _cache, ...environment } = process.env;
  const child = spawn('/usr/bin/python3', [join(import.meta.dirname, 'spsolve.py'), source, target], {
    env: { ...environment, OPENBLAS_NUM_THREADS: '1' },
    stdio: ['pipe', 'pipe', 'inherit'],
  });
  const lines = createInterface({ input: child.stdout })[Symbol.asyncIterator]();
  return {
    async seconds(method: string): Promise<number> {
      child.stdin.write(`${method}\n`);
      const { value, done } = await lines.next();
      if (done) throw new Error('scipy stopped; is python3-scipy installed for /usr/bin/python3?');
      return Number(value);
    },
    solution(): Float64Array {
      const bytes = readFileSync(target);
      return new Float64Array(bytes.buffer.slice(bytes.byteOffset, bytes.byteOffset + bytes.byteLength));
    },
    stop() {
      child.stdin.end();
      rmSync(folder, { recursive: true });
    },
  };
}

function timed<T>(work: () => T): [milliseconds: number, result: T] {
  const start = performance.now();
  const result = work();
  return [performance.now() - start, result];
}

function quantile(values: readonly number[], share: number): number {
  return values.toSorted((a, b) => a - b)[Math.floor(share * (values.length - 1))]!;
}

/** The largest difference over the largest value. */
function difference(a: Float64Array, b: Float64Array): number {
  const largest = b.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  return a.reduce((most, value, k) => Math.max(most, Math.abs(value - b[k]!)), 0) / largest;
}
