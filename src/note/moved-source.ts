// The fences and prose values of a text that a keystroke made of another, taken from those of the other.
import type { SourceLine } from '../language/syntax.ts';
import { type Change, keepsFence, keepsProse } from './change.ts';
import type { Source, SourceFence, SourceSpan } from './fences.ts';
import { shifted } from './shift.ts';

export interface MovedSource {
  readonly source: Source;
  /** The fence whose words changed, as an index; undefined where only prose did. */
  readonly changed: number | undefined;
}

/** Undefined where the change may have made or unmade a block, so that the text must be read afresh. */
export function movedSource(source: Source, before: string, after: string, change: Change): MovedSource | undefined {
  const index = source.fences.findIndex(({ range }) => change.start <= range.end && change.oldEnd >= range.start);
  if (index < 0) {
    if (!keepsProse(before, after, change)) return undefined;
    return { source: moveAll(source, change), changed: undefined };
  }
  const fence = source.fences[index]!;
  const line = fence.lines.findIndex(
    ({ text, start }) => start <= change.start && change.oldEnd <= start + text.length,
  );
  if (line < 0 || !keepsFence(before, after, change, fence.lines[line]!.start)) return undefined;
  const moved = moveAll(source, change);
  const fences = moved.fences.slice();
  fences[index] = withLine(fence, moved.fences[index]!, line, after, change);
  return { source: { fences, spans: moved.spans }, changed: index };
}

/** Fences and spans behind the change, moved; those before it are the same objects. */
function moveAll(source: Source, change: Change): Source {
  if (change.shift === 0) return source;
  return {
    fences: source.fences.map(fence => moveFence(fence, change)),
    spans: source.spans.map(span => moveSpan(span, change)),
  };
}

function moveFence(fence: SourceFence, change: Change): SourceFence {
  if (fence.range.end < change.oldEnd) return fence;
  const lines = fence.lines.map(line => moveLine(line, change));
  return { ...fence, range: shifted(fence.range, [change]), lines };
}

function moveLine(line: SourceLine, change: Change): SourceLine {
  return line.start < change.oldEnd ? line : { text: line.text, start: line.start + change.shift };
}

function moveSpan(span: SourceSpan, change: Change): SourceSpan {
  if (span.range.start < change.oldEnd) return span;
  return { ...span, range: shifted(span.range, [change]), start: span.start + change.shift };
}

function withLine(fence: SourceFence, moved: SourceFence, index: number, after: string, change: Change): SourceFence {
  const { start, text } = fence.lines[index]!;
  const lines = moved.lines.slice();
  lines[index] = { start, text: after.slice(start, start + text.length + change.shift) };
  return { ...moved, lines };
}
