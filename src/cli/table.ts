// Columns of text that stand under one another on a terminal.
import { safeText, widthOf } from './safe-text.ts';

export interface Cell {
  /** Several lines where the text is wrapped; they continue below in the same column. */
  readonly lines: readonly string[];
  /** Applied to each line after it has been made safe and padded. */
  readonly style?: (text: string) => string;
}

/** `point` sets numbers so that their decimal points stand under one another. */
export type Alignment = 'left' | 'right' | 'point';

const GAP = '  ';

/** What the columns of rows take, the gaps between them included. */
export function widthOfColumns(rows: readonly (readonly Cell[])[], alignments: readonly Alignment[]): number {
  const widths = alignments.map((alignment, column) => measureColumn(rows, column, alignment).width);
  return widths.reduce((sum, width) => sum + width, GAP.length * (widths.length - 1));
}

/** Rows as lines, trailing blanks left out. Every text is made safe here. */
export function layOut(rows: readonly (readonly Cell[])[], alignments: readonly Alignment[], indent: string): string[] {
  const columns = alignments.map((alignment, column) => measureColumn(rows, column, alignment));
  return rows.flatMap(row => {
    const height = Math.max(...row.map(({ lines }) => lines.length));
    return Array.from({ length: height }, (_, line) => {
      const cells = row.map((cell, column) => {
        const text = safeText(cell.lines[line] ?? '');
        const { width, whole } = columns[column]!;
        const lead = leading(text, alignments[column]!, width, whole);
        const trail = Math.max(0, width - lead - widthOf(text));
        return { styled: ' '.repeat(lead) + (cell.style?.(text) ?? text), trail, empty: text === '' };
      });
      return indent + joined(cells);
    });
  });
}

/** Breaks at blanks so that no line is wider than `width`, unless a word alone is. */
export function wrap(text: string, width: number): string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(' ')) {
    if (line !== '' && widthOf(`${line} ${word}`) > width) {
      lines.push(line);
      line = word;
    } else line = line === '' ? word : `${line} ${word}`;
  }
  return [...lines, line];
}

function joined(cells: readonly { styled: string; trail: number; empty: boolean }[]): string {
  const last = cells.findLastIndex(({ empty }) => !empty);
  return cells
    .slice(0, last + 1)
    .map(({ styled, trail }, column) => (column === last ? styled : styled + ' '.repeat(trail)))
    .join(GAP);
}

/** Width of a column, and of the part before the decimal point in one that is aligned there. */
function measureColumn(rows: readonly (readonly Cell[])[], column: number, alignment: Alignment) {
  const texts = rows.flatMap(row => row[column]?.lines ?? []).map(safeText);
  const whole = alignment === 'point' ? Math.max(0, ...texts.map(wholeWidth)) : 0;
  const width = Math.max(
    0,
    ...texts.map(text => (alignment === 'point' ? whole - wholeWidth(text) + widthOf(text) : widthOf(text))),
  );
  return { width, whole };
}

function leading(text: string, alignment: Alignment, width: number, whole: number): number {
  if (text === '' || alignment === 'left') return 0;
  return alignment === 'right' ? width - widthOf(text) : whole - wholeWidth(text);
}

/** Width of what stands before the decimal point of the first number; of a text without a number, nothing. */
function wholeWidth(text: string): number {
  const head = /^[^0-9]*[0-9]+/.exec(text);
  return head === null ? 0 : widthOf(head[0]);
}
