// What a field is labelled with: its extremes, jumps and zero crossings along a member, taken from the exact polynomials.
import { evaluate, extremes, roots } from '../mechanics/polynomial.ts';
import type { FieldPiece, MemberField } from '../mechanics/solution.ts';

export type Quantity = 'axialForce' | 'shearForce' | 'bendingMoment' | 'transverseMovement';

/** A value (SI) at a distance along the member, m. */
export interface Reading {
  readonly distance: number;
  readonly value: number;
  readonly piece: FieldPiece;
  /** `level`: a place of level slope inside a piece. `before`, `after`: the side of a jump or of a border it belongs to. */
  readonly kind: 'level' | 'before' | 'after';
  /** Neighbouring readings of one value share a run. */
  readonly run: number;
}

/** A value smaller than this share of the largest is rounding. */
const NEGLIGIBLE = 1e-9;

/** Every candidate along the member: the ends of all pieces and the places of level slope, in order. */
function readingsAlong(field: MemberField, quantity: Quantity): Reading[] {
  const readings = field.pieces.flatMap(piece => {
    const length = piece.end - piece.start;
    if (!(length > 0)) return [];
    const polynomial = piece[quantity];
    return extremes(polynomial, 0, length).map(
      (s): Reading => ({
        distance: piece.start + s,
        value: evaluate(polynomial, s),
        piece,
        kind: s === 0 ? 'after' : s === length ? 'before' : 'level',
        run: 0,
      }),
    );
  });
  const noise = NEGLIGIBLE * Math.max(0, ...readings.map(({ value }) => Math.abs(value)));
  let run = 0;
  return readings.map((reading, i) => {
    const before = readings[i - 1];
    if (before !== undefined && Math.abs(before.value - reading.value) > noise) run++;
    return { ...reading, run };
  });
}

export function largestSize(fields: readonly MemberField[], quantity: Quantity): number {
  return Math.max(0, ...fields.flatMap(field => readingsAlong(field, quantity).map(({ value }) => Math.abs(value))));
}

/** Readings whose neighbours on the same side of zero are no larger; of a level run, the middle one. */
export function localExtremes(field: MemberField, quantity: Quantity, largest: number): Reading[] {
  const readings = readingsAlong(field, quantity);
  const floor = NEGLIGIBLE * largest;
  const found: Reading[] = [];
  for (let i = 0; i < readings.length; ) {
    const first = readings[i] as Reading;
    let last = i;
    while (readings[last + 1]?.run === first.run) last++;
    const size = Math.abs(first.value);
    const isPeak = beyond(readings[i - 1], first) <= size && beyond(readings[last + 1], first) <= size;
    if (size > floor && isPeak) found.push(peakOf(readings.slice(i, last + 1)));
    i = last + 1;
  }
  return found;
}

/** The two sides of each jump, and the ends where the value is not zero; of a level run, both its ends. */
export function jumps(field: MemberField, quantity: Quantity, largest: number): Reading[] {
  const readings = readingsAlong(field, quantity);
  const floor = NEGLIGIBLE * largest;
  return readings.filter((reading, i) => {
    if (Math.abs(reading.value) <= floor || reading.kind === 'level') return false;
    const neighbour = reading.kind === 'after' ? readings[i - 1] : readings[i + 1];
    return neighbour === undefined || neighbour.run !== reading.run;
  });
}

/** Distances along the member at which the value changes sign without a jump. */
export function zeroCrossings(field: MemberField, quantity: Quantity, largest: number): number[] {
  const floor = NEGLIGIBLE * largest;
  const found: number[] = [];
  for (const piece of field.pieces) {
    const length = piece.end - piece.start;
    for (const s of roots(piece[quantity], 0, length)) {
      if (s <= 1e-6 * length || s >= length * (1 - 1e-6)) continue;
      const step = length * 1e-3;
      const before = evaluate(piece[quantity], Math.max(0, s - step));
      const after = evaluate(piece[quantity], Math.min(length, s + step));
      if (before * after < 0 && Math.abs(before) > floor * 1e-3) found.push(piece.start + s);
    }
  }
  return found;
}

/** Size of a neighbour as far as it lies on the same side of zero. */
function beyond(neighbour: Reading | undefined, reading: Reading): number {
  return neighbour === undefined ? 0 : Math.max(0, neighbour.value * Math.sign(reading.value));
}

function peakOf(run: readonly Reading[]): Reading {
  return run.find(reading => reading.kind === 'level') ?? (run[Math.floor((run.length - 1) / 2)] as Reading);
}
