// `point`, `hinge`, `connection` and `release`: where points are, and how members meet there.

import { readOnMember } from '../places.ts';
import type { Reader } from '../reader.ts';
import type { Name } from '../syntax.ts';
import { readValue } from '../values.ts';
import type { StatementForm } from './form.ts';
import { colon, snippet } from './form.ts';

export const POINT: StatementForm = {
  keyword: 'point',
  help: 'Places a point by coordinates (x right, y up) or along a member.',
  grammar: 'point NAME: X, Y | DISTANCE from P [towards P] on MEMBER',
  examples: ['point P: 2.4 m, 3.0 m', 'point Q: 1.1 m from A on R1', 'point S: 0.6 m from B towards A on R1'],
  skeleton: snippet('point {P}: {0 m}, {0 m}'),
  read: reader => {
    const name = reader.name('the name of the point');
    if (!name || !colon(reader, 'where it is')) return undefined;
    const from = reader.position;
    const x = readValue(reader);
    if (!x) return undefined;
    if (reader.isWord('from')) {
      const at = readOnMember(reader, x, from);
      return at && { kind: 'point', name, at };
    }
    if (!reader.mark(',', 'the second coordinate stands behind it')) return undefined;
    const y = readValue(reader);
    return y && { kind: 'point', name, at: { kind: 'coordinates', x, y } };
  },
};

export const HINGE: StatementForm = {
  keyword: 'hinge',
  help: 'Frees the moment of all members at a point, or of one member there.',
  grammar: 'hinge P [in MEMBER]',
  examples: ['hinge B', 'hinge B in R1'],
  skeleton: snippet('hinge {B}'),
  read: reader => {
    const point = reader.name('a point');
    if (!point) return undefined;
    const member = reader.takeWord('in') && reader.name('a member');
    return reader.failure ? undefined : { kind: 'hinge', point, ...(member && { member }) };
  },
};

export const CONNECTION: StatementForm = {
  keyword: 'connection',
  help: 'Makes the end of a member semi-rigid: moment for each radian between member and joint.',
  grammar: 'connection P in MEMBER: VALUE',
  examples: ['connection B in R1: 850 kN m/rad'],
  skeleton: snippet('connection {B} in {R1}: {850 kN m/rad}'),
  read: reader => {
    const end = readMemberEnd(reader);
    if (!end || !colon(reader, 'its stiffness')) return undefined;
    const stiffness = readValue(reader);
    return stiffness && { kind: 'connection', ...end, stiffness };
  },
};

export const RELEASE: StatementForm = {
  keyword: 'release',
  help: 'Frees axial force, shear or moment of a member at a point.',
  grammar: 'release P in MEMBER: axial | shear | moment {, …}',
  examples: ['release B in R1: axial', 'release B in R1: shear, moment'],
  skeleton: snippet('release {B} in {R1}: {axial}'),
  read: reader => {
    const end = readMemberEnd(reader);
    if (!end || !colon(reader, 'what is freed')) return undefined;
    const freed: (typeof FREED)[number][] = [];
    do {
      const word = FREED.find(known => reader.takeWord(known));
      if (!word) return reader.dueOneOf('what is freed', FREED);
      freed.push(word);
    } while (reader.takeMark(','));
    return { kind: 'release', ...end, freed };
  },
};

const FREED = ['axial', 'shear', 'moment'] as const;

function readMemberEnd(reader: Reader): { readonly point: Name; readonly member: Name } | undefined {
  const point = reader.name('a point');
  if (!point || !reader.word('in', 'the member')) return undefined;
  const member = reader.name('a member');
  return member && { point, member };
}
