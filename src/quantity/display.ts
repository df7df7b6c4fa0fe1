// How a quantity is shown: four significant figures, in the units that the note chose for its kind.

export type DisplayKind = 'force' | 'length' | 'deflection' | 'moment' | 'stress' | 'rotation' | 'line load';

/** A unit as shown and its size in SI. */
export interface DisplayUnit {
  readonly text: string;
  readonly size: number;
}

export type DisplayUnits = Readonly<Record<DisplayKind, DisplayUnit>>;
