// Moves places in a note by what a change before them added or took away.
import type { Change } from './change.ts';

/**
 * A copy of plain data in which every place behind the change is moved: each `start` and `end` that is a number. Data
 * without a place behind it is returned as it is.
 */
export function shifted<T>(data: T, { oldEnd, shift }: Pick<Change, 'oldEnd' | 'shift'>): T {
  if (shift === 0) return data;
  // The copy has the shape of what it was made of.
  return move(data, oldEnd, shift) as T;
}

function move(data: unknown, from: number, by: number): unknown {
  if (typeof data !== 'object' || data === null) return data;
  if (Array.isArray(data)) {
    let copy: unknown[] | undefined;
    for (let i = 0; i < data.length; i++) {
      const moved = move(data[i], from, by);
      if (moved !== data[i]) copy ??= data.slice();
      if (copy !== undefined) copy[i] = moved;
    }
    return copy ?? data;
  }
  const source = data as Record<string, unknown>;
  let copy: Record<string, unknown> | undefined;
  for (const key in source) {
    const value = source[key];
    const moved =
      typeof value === 'number' ? (isPlace(key) && value >= from ? value + by : value) : move(value, from, by);
    if (moved === value) continue;
    copy ??= { ...source };
    copy[key] = moved;
  }
  return copy ?? data;
}

function isPlace(key: string): boolean {
  return key === 'start' || key === 'end';
}
