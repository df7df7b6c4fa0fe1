// What an unknown of the force method is, in the structure's own terms.
import type { Ground } from './grounds.ts';
import type { Statics } from './statics.ts';

export type UnknownForce =
  /** At the start of the leg. */
  | { readonly kind: 'axial force'; readonly member: number; readonly leg: number }
  /** At an end of the leg, which stands at the point. */
  | { readonly kind: 'moment'; readonly member: number; readonly leg: number; readonly point: number }
  | { readonly kind: 'reaction'; readonly ground: Ground };

/** `unknown`: as numbered in statics.ts. */
export function unknownForce({ legs, grounds, firstReaction }: Statics, unknown: number): UnknownForce {
  if (unknown >= firstReaction) return { kind: 'reaction', ground: grounds[unknown - firstReaction]! };
  const { member, index, from, to } = legs[Math.floor(unknown / 3)]!;
  if (unknown % 3 === 0) return { kind: 'axial force', member, leg: index };
  return { kind: 'moment', member, leg: index, point: unknown % 3 === 1 ? from : to };
}
