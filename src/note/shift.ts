// Moves places in a note by what changes before them added or took away.
import type { Change } from './change.ts';

/** What of a change says where a place behind it goes. */
export type Shift = Pick<Change, 'oldEnd' | 'shift'>;

/**
 * A copy of plain data in which every place is moved by each change in turn: each `start` and `end` that is a number.
 * Data that nothing moves is returned as it is.
 */
export function shifted<T>(data: T, changes: readonly Shift[]): T {
  // The copy has the shape of what it was made of.
  return move(data, changes) as T;
}

function move(data: unknown, changes: readonly Shift[]): unknown {
  if (typeof data !== 'object' || data === null) return data;
  if (Array.isArray(data)) {
    let copy: unknown[] | undefined;
    for (let i = 0; i < data.length; i++) {
      const moved = move(data[i], changes);
      if (moved !== data[i]) copy ??= data.slice();
      if (copy !== undefined) copy[i] = moved;
    }
    return copy ?? data;
  }
  // Plain data: its own keys are all there is.
  const source = data as Record<string, unknown>;
  let copy: Record<string, unknown> | undefined;
  for (const key in source) {
    const value = source[key];
    const moved = typeof value === 'number' ? (isPlace(key) ? movePlace(value, changes) : value) : move(value, changes);
    if (moved === value) continue;
    copy ??= { ...source };
    copy[key] = moved;
  }
  return copy ?? data;
}

function isPlace(key: string): boolean {
  return key === 'start' || key === 'end';
}

function movePlace(place: number, changes: readonly Shift[]): number {
  let moved = place;
  for (const { oldEnd, shift } of changes) if (moved >= oldEnd) moved += shift;
  return moved;
}
