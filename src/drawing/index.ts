// The public face of the drawing room: structures, loads and fields as SVG.
export type { Acting } from './acting.ts';
export { caseSketch } from './case-sketch.ts';
export type { Envelope, OutlinePiece } from './envelope.ts';
export { FIELD_STYLES, type FieldName } from './field-curves.ts';
export type { Panel } from './frame-fields.ts';
export type { Palette } from './ink.ts';
export { loadSum } from './load-sum.ts';
export { mechanismDrawing } from './mechanism.ts';
export { type MemberPlate, memberPlate } from './member-plate.ts';
export { memberSketch } from './member-sketch.ts';
export { strainWords } from './strain-words.ts';
export { MOST_LEGS, type StructureDrawing, structureDrawing } from './structure-drawing.ts';
export { legCount } from './view.ts';
export { escapeText } from './words.ts';
