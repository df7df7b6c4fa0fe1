// The dense arithmetic of the factorisation: pivots are eliminated from one front, and what they leave behind is taken
// off the part of the front that waits for later pivots. All of it is dot products of rows, three rows by three at a
// time, so that eighteen operations share six loads.

/**
 * Where the elimination of one front finds its data. A panel is stored by rows: entry (row, column) stands at
 * `start + row × width + column`. Its first `width` rows are those of the pivots; above the diagonal it holds nothing.
 */
export interface Panel {
  /** In: the assembled columns. Out: the same columns of L, its unit diagonal not stored. */
  readonly values: Float64Array;
  readonly start: number;
  /** Rows, those of the pivots included. */
  readonly height: number;
  /** Pivots. */
  readonly width: number;
}

/**
 * Eliminates the pivots of a panel, LDLᵀ, each column when all before it are done (left-looking: Golub and Van Loan,
 * Matrix Computations, 4th edition, section 4.1.2). `scaled` receives L·D, laid out as the panel but from 0.
 * `pivots[first + k]` receives the k-th pivot as found, and `inverses` its inverse; a pivot that is not larger than
 * `tolerance` in size gets an inverse of 0, by which its column of L is 0 and its freedom drops out.
 */
export function eliminate(
  panel: Panel,
  scaled: Float64Array,
  pivots: Float64Array,
  inverses: Float64Array,
  first: number,
  tolerance: number,
): void {
  const { width } = panel;
  let column = 0;
  for (; column + 3 <= width; column += 3) {
    if (column > 0) updateThreeColumns(panel, scaled, column);
    finishThreeColumns(panel, scaled, column, pivots, inverses, first + column, tolerance);
  }
  for (; column < width; column++) {
    eliminateColumn(panel, scaled, column, pivots, inverses, first + column, tolerance);
  }
}

/**
 * Takes what the pivots of a panel carry off the remainder of its front: C − (L·D)·Lᵀ of the rows below the pivots.
 * C is a lower triangle packed by rows from `offset` on: entry (i, j) at `offset + i (i + 1) / 2 + j`.
 */
export function updateRemainder(panel: Panel, scaled: Float64Array, remainder: Float64Array, offset: number): void {
  const { values, start, height, width } = panel;
  const size = height - width;
  const panelStart = start + width * width;
  const scaledStart = width * width;
  let i = 0;
  for (; i + 3 <= size; i += 3) {
    const a0 = scaledStart + i * width;
    const a1 = a0 + width;
    const a2 = a1 + width;
    const r0 = offset + (i * (i + 1)) / 2;
    const r1 = r0 + i + 1;
    const r2 = r1 + i + 2;
    for (let j = 0; j <= i; j += 3) {
      const b0 = panelStart + j * width;
      const b1 = b0 + width;
      const b2 = b1 + width;
      let s00 = 0;
      let s01 = 0;
      let s02 = 0;
      let s10 = 0;
      let s11 = 0;
      let s12 = 0;
      let s20 = 0;
      let s21 = 0;
      let s22 = 0;
      for (let t = 0; t < width; t++) {
        const x0 = scaled[a0 + t]!;
        const x1 = scaled[a1 + t]!;
        const x2 = scaled[a2 + t]!;
        const y0 = values[b0 + t]!;
        const y1 = values[b1 + t]!;
        const y2 = values[b2 + t]!;
        s00 += x0 * y0;
        s01 += x0 * y1;
        s02 += x0 * y2;
        s10 += x1 * y0;
        s11 += x1 * y1;
        s12 += x1 * y2;
        s20 += x2 * y0;
        s21 += x2 * y1;
        s22 += x2 * y2;
      }
      remainder[r0 + j]! -= s00;
      remainder[r1 + j]! -= s10;
      remainder[r1 + j + 1]! -= s11;
      remainder[r2 + j]! -= s20;
      remainder[r2 + j + 1]! -= s21;
      remainder[r2 + j + 2]! -= s22;
      // On the diagonal the rest belongs to the upper triangle, which is not stored.
      if (j === i) break;
      remainder[r0 + j + 1]! -= s01;
      remainder[r0 + j + 2]! -= s02;
      remainder[r1 + j + 2]! -= s12;
    }
  }
  for (; i < size; i++) {
    const a = scaledStart + i * width;
    const r = offset + (i * (i + 1)) / 2;
    for (let j = 0; j <= i; j++) remainder[r + j]! -= dot(scaled, a, values, panelStart + j * width, width);
  }
}

/** Takes the columns before `column` off the three that begin with it, in every row from `column` down. */
function updateThreeColumns(panel: Panel, scaled: Float64Array, column: number): void {
  const { values, start, height, width } = panel;
  const b0 = start + column * width;
  const b1 = b0 + width;
  const b2 = b1 + width;
  let row = column;
  for (; row + 3 <= height; row += 3) {
    const a0 = row * width;
    const a1 = a0 + width;
    const a2 = a1 + width;
    let s00 = 0;
    let s01 = 0;
    let s02 = 0;
    let s10 = 0;
    let s11 = 0;
    let s12 = 0;
    let s20 = 0;
    let s21 = 0;
    let s22 = 0;
    for (let t = 0; t < column; t++) {
      const x0 = scaled[a0 + t]!;
      const x1 = scaled[a1 + t]!;
      const x2 = scaled[a2 + t]!;
      const y0 = values[b0 + t]!;
      const y1 = values[b1 + t]!;
      const y2 = values[b2 + t]!;
      s00 += x0 * y0;
      s01 += x0 * y1;
      s02 += x0 * y2;
      s10 += x1 * y0;
      s11 += x1 * y1;
      s12 += x1 * y2;
      s20 += x2 * y0;
      s21 += x2 * y1;
      s22 += x2 * y2;
    }
    const r0 = start + row * width + column;
    const r1 = r0 + width;
    const r2 = r1 + width;
    values[r0]! -= s00;
    values[r0 + 1]! -= s01;
    values[r0 + 2]! -= s02;
    values[r1]! -= s10;
    values[r1 + 1]! -= s11;
    values[r1 + 2]! -= s12;
    values[r2]! -= s20;
    values[r2 + 1]! -= s21;
    values[r2 + 2]! -= s22;
  }
  for (; row < height; row++) {
    const a = row * width;
    const r = start + a + column;
    values[r]! -= dot(scaled, a, values, b0, column);
    values[r + 1]! -= dot(scaled, a, values, b1, column);
    values[r + 2]! -= dot(scaled, a, values, b2, column);
  }
}

/** Factorises the 3 × 3 block on the diagonal, columns before it taken off already, and divides the rows below by it. */
function finishThreeColumns(
  panel: Panel,
  scaled: Float64Array,
  column: number,
  pivots: Float64Array,
  inverses: Float64Array,
  first: number,
  tolerance: number,
): void {
  const { values, start, height, width } = panel;
  const d0 = start + column * width + column;
  const d1 = d0 + width;
  const d2 = d1 + width;
  const inverse0 = takePivot(pivots, inverses, first, values[d0]!, tolerance);
  const w10 = values[d1]!;
  const w20 = values[d2]!;
  const l10 = w10 * inverse0;
  const l20 = w20 * inverse0;
  const inverse1 = takePivot(pivots, inverses, first + 1, values[d1 + 1]! - w10 * l10, tolerance);
  const w21 = values[d2 + 1]! - w20 * l10;
  const l21 = w21 * inverse1;
  const inverse2 = takePivot(pivots, inverses, first + 2, values[d2 + 2]! - w20 * l20 - w21 * l21, tolerance);
  values[d1] = l10;
  values[d2] = l20;
  values[d2 + 1] = l21;

  for (let row = column + 3; row < height; row++) {
    const a = row * width + column;
    const r = start + a;
    const w0 = values[r]!;
    const w1 = values[r + 1]! - w0 * l10;
    const w2 = values[r + 2]! - w0 * l20 - w1 * l21;
    scaled[a] = w0;
    scaled[a + 1] = w1;
    scaled[a + 2] = w2;
    values[r] = w0 * inverse0;
    values[r + 1] = w1 * inverse1;
    values[r + 2] = w2 * inverse2;
  }
}

/** One of the last columns of a panel whose width is not a multiple of three. */
function eliminateColumn(
  panel: Panel,
  scaled: Float64Array,
  column: number,
  pivots: Float64Array,
  inverses: Float64Array,
  position: number,
  tolerance: number,
): void {
  const { values, start, height, width } = panel;
  const b = start + column * width;
  const diagonal = values[b + column]! - dot(scaled, column * width, values, b, column);
  const inverse = takePivot(pivots, inverses, position, diagonal, tolerance);
  for (let row = column + 1; row < height; row++) {
    const a = row * width;
    const w = values[start + a + column]! - dot(scaled, a, values, b, column);
    scaled[a + column] = w;
    values[start + a + column] = w * inverse;
  }
}

/** Records a pivot and gives its inverse, 0 for a singular one (not a number counts as singular). */
function takePivot(
  pivots: Float64Array,
  inverses: Float64Array,
  position: number,
  pivot: number,
  tolerance: number,
): number {
  const inverse = Math.abs(pivot) > tolerance ? 1 / pivot : 0;
  pivots[position] = pivot;
  inverses[position] = inverse;
  return inverse;
}

function dot(a: Float64Array, aStart: number, b: Float64Array, bStart: number, length: number): number {
  let sum = 0;
  for (let t = 0; t < length; t++) sum += a[aStart + t]! * b[bStart + t]!;
  return sum;
}
