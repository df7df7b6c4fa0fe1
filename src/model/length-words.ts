// Lengths in the words of messages about geometry, without needless noughts.
import { significant } from '../quantity/number.ts';

export function metres(length: number): string {
  return `${significant(length)} m`.replace(/(\.\d*?)0+ m$/, '$1 m').replace('. m', ' m');
}

export function millimetres(length: number): string {
  return `${significant(length * 1000)} mm`.replace(/(\.\d*?)0+ mm$/, '$1 mm').replace('. mm', ' mm');
}

/** `6 m right, 0.9 m up`. */
export function headings(dx: number, dy: number): string {
  const across = dx === 0 ? [] : [`${metres(Math.abs(dx))} ${dx > 0 ? 'right' : 'left'}`];
  const upright = dy === 0 ? [] : [`${metres(Math.abs(dy))} ${dy > 0 ? 'up' : 'down'}`];
  return [...across, ...upright].join(', ');
}
