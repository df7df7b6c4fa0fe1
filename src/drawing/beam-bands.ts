// What acts across a level beam, case by case, as stretches over which the load is linear: loads of one case that overlap
// are added, so that each case is one row of bands on one baseline.
import type { Structure } from '../model/structure.ts';
import { type ActingCase, perMetre, type Stretch } from './acting-loads.ts';

/** Intensities in N/m per metre of beam, positive down (across) or to the right (along). x from the left, m. */
export interface BeamBand {
  readonly from: number;
  readonly to: number;
  readonly fromIntensity: number;
  readonly toIntensity: number;
  /** The part of it that is self-weight, N/m, and how many loads come together. */
  readonly weight: number;
  readonly loads: number;
}

export function acrossBands(structure: Structure, acting: ActingCase): BeamBand[] {
  return bands(structure, acting, stretch => -stretch.y);
}

export function alongBands(structure: Structure, acting: ActingCase): BeamBand[] {
  return bands(structure, acting, stretch => stretch.x);
}

interface Ramp {
  readonly from: number;
  readonly to: number;
  readonly fromIntensity: number;
  readonly toIntensity: number;
  readonly isWeight: boolean;
  readonly load: number;
}

function bands(structure: Structure, acting: ActingCase, share: (stretch: Stretch) => number): BeamBand[] {
  const ramps = acting.stretches.flatMap(stretch => ramp(structure, stretch, share(stretch)));
  const places = [...new Set(ramps.flatMap(({ from, to }) => [from, to]))].sort((a, b) => a - b);
  const extent = (places.at(-1) ?? 0) - (places[0] ?? 0);
  const found: BeamBand[] = [];
  for (const [i, to] of places.entries()) {
    const from = places[i - 1];
    if (from === undefined || to - from <= 1e-9 * extent) continue;
    const over = ramps.filter(ramp => ramp.from < (from + to) / 2 && ramp.to > (from + to) / 2);
    if (over.length === 0) continue;
    const band: BeamBand = {
      from,
      to,
      fromIntensity: sum(over, ramp => valueAt(ramp, from)),
      toIntensity: sum(over, ramp => valueAt(ramp, to)),
      weight: sum(
        over.filter(ramp => ramp.isWeight),
        ramp => valueAt(ramp, from),
      ),
      loads: new Set(over.map(ramp => ramp.load)).size,
    };
    const last = found.at(-1);
    if (last !== undefined && continues(last, band)) found[found.length - 1] = merged(last, band);
    else found.push(...oneSided(band));
  }
  return found.filter(({ fromIntensity, toIntensity }) => fromIntensity !== 0 || toIntensity !== 0);
}

function ramp(structure: Structure, stretch: Stretch, share: number): Ramp[] {
  if (Math.abs(share) < 1e-12) return [];
  const origin = structure.points[stretch.leg.from]?.x ?? 0;
  const at = (along: number): number => origin + (along - stretch.leg.start) * stretch.leg.cosine;
  const { start, end } = perMetre(stretch);
  const one = { at: at(stretch.start), intensity: start * share };
  const other = { at: at(stretch.end), intensity: end * share };
  const [left, right] = one.at <= other.at ? [one, other] : [other, one];
  return [
    {
      from: left.at,
      to: right.at,
      fromIntensity: left.intensity,
      toIntensity: right.intensity,
      isWeight: stretch.kind === 'weight',
      load: stretch.load,
    },
  ];
}

function valueAt(ramp: Ramp, x: number): number {
  const share = (x - ramp.from) / (ramp.to - ramp.from);
  return ramp.fromIntensity + (ramp.toIntensity - ramp.fromIntensity) * share;
}

function sum<T>(items: readonly T[], value: (item: T) => number): number {
  return items.reduce((total, item) => total + value(item), 0);
}

/** Whether the second goes on where the first stops, in value and slope: the border between legs is then no border. */
function continues(first: BeamBand, second: BeamBand): boolean {
  const size = Math.max(Math.abs(first.fromIntensity), Math.abs(second.toIntensity), Math.abs(second.fromIntensity));
  const slope = (band: BeamBand): number => (band.toIntensity - band.fromIntensity) / (band.to - band.from);
  return (
    first.loads === second.loads &&
    Math.abs(first.to - second.from) <= 1e-9 * (second.to - first.from) &&
    Math.abs(first.toIntensity - second.fromIntensity) <= 1e-9 * size &&
    Math.abs(slope(first) - slope(second)) * (second.to - first.from) <= 1e-9 * size &&
    Math.abs(first.weight - second.weight) <= 1e-9 * size
  );
}

function merged(first: BeamBand, second: BeamBand): BeamBand {
  return { ...first, to: second.to, toIntensity: second.toIntensity };
}

/** A band that changes sides is two. */
function oneSided(band: BeamBand): BeamBand[] {
  const { from, to, fromIntensity, toIntensity } = band;
  if (fromIntensity * toIntensity >= 0) return [band];
  const zero = from + ((to - from) * fromIntensity) / (fromIntensity - toIntensity);
  return [
    { ...band, to: zero, toIntensity: 0 },
    { ...band, from: zero, fromIntensity: 0 },
  ];
}
