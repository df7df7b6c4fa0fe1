// Which of very many single loads are drawn.

/** A single load, as far as it matters here. */
interface Placed {
  readonly x: number;
  readonly y: number;
  readonly moment: number;
  readonly place: { readonly x: number; readonly y: number };
  readonly row: number | undefined;
  readonly inRow: { readonly count: number; readonly step: number } | undefined;
}

/** So many arrows of one row, and so many single loads of one case, can be told apart. */
const MOST_IN_ROW = 40;
const MOST_SINGLES = 60;

/** How many single loads, those of rows apart, `thinned` leaves out. */
export function leftOut(singles: readonly Pick<Placed, 'row'>[]): number {
  return Math.max(0, singles.filter(({ row }) => row === undefined).length - MOST_SINGLES);
}

/** A long row keeps its ends and an even choice between them; of many single loads the largest stay. */
export function thinned<Single extends Placed>(singles: readonly Single[]): Single[] {
  const byRow = new Map<number, Single[]>();
  const lone: Single[] = [];
  for (const one of singles) {
    if (one.row === undefined) lone.push(one);
    else if (byRow.get(one.row)?.push(one) === undefined) byRow.set(one.row, [one]);
  }
  const rows = [...byRow.values()].flatMap(row => {
    const step = Math.ceil((row.length - 1) / MOST_IN_ROW) || 1;
    const [first, second] = row as [Single, Single | undefined];
    const apart = second === undefined ? 0 : Math.hypot(second.place.x - first.place.x, second.place.y - first.place.y);
    const inRow = { count: row.length, step: apart };
    return row.filter((_, i) => i % step === 0 || i === row.length - 1).map(one => ({ ...one, inRow }));
  });
  const size = ({ x, y, moment }: Single): number => Math.hypot(x, y) + Math.abs(moment);
  const kept = lone.length > MOST_SINGLES ? [...lone].sort((a, b) => size(b) - size(a)).slice(0, MOST_SINGLES) : lone;
  return [...kept, ...rows];
}
