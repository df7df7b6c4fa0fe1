// The head line of a structure: its name, how its requirements stand, and what was assumed.
import type { Structure } from '../model/structure.ts';
import type { Answer, NoteResult, StructureResult } from '../note/result.ts';
import { escapeHtml, listed, plainHtml } from './html.ts';
import { stateMark, stateOf } from './marks.ts';

export function headLine(note: NoteResult, result: StructureResult): string {
  const title = result.title === undefined ? '' : ` <span>${escapeHtml(result.title)}</span>`;
  const answers = result.answers.flatMap(index => note.answers[index] ?? []);
  return (
    `<header class="tl-head"><h2>${escapeHtml(result.name)}${title}</h2>` +
    `<p class="tl-state">${stateLine(result, answers)}</p>` +
    `<p class="tl-assumptions">${assumptions(result).join(' ')}</p></header>`
  );
}

function stateLine(result: StructureResult, answers: readonly Answer[]): string {
  const asked = answers.filter(({ kind }) => kind === 'require');
  const withheld = answers.filter(answer => stateOf(answer) === 'withheld');
  if (result.withheld !== undefined) {
    return `<span class="tl-nowrap">${stateMark('withheld')}<b>Withheld:</b></span> ${plainHtml(sentence(result.withheld))}`;
  }
  const parts: string[] = [];
  if (asked.length === 0) parts.push('<b>No requirement asked.</b>');
  else {
    const met = asked.filter(answer => stateOf(answer) === 'met').length;
    const verdict = met === asked.length && met > 1 ? `All ${met}` : `${met} of ${asked.length}`;
    const noun = asked.length === 1 ? 'requirement' : 'requirements';
    const highest = highestUse(asked);
    parts.push(
      `<b>${verdict} ${noun} met${highest === undefined ? '.' : ','}</b>${highest === undefined ? '' : ` ${highest}`}`,
    );
  }
  const failed = asked.filter(answer => stateOf(answer) === 'not met');
  if (failed.length > 0) parts.push(named('not met', 'Not met:', failed));
  if (withheld.length > 0) parts.push(named('withheld', 'Withheld:', withheld));
  return parts.join(' ');
}

function highestUse(answers: readonly Answer[]): string | undefined {
  let highest: Answer | undefined;
  for (const answer of answers) {
    if (answer.utilisation === undefined || answer.quantity === undefined) continue;
    if (highest?.utilisation === undefined || answer.utilisation > highest.utilisation) highest = answer;
  }
  return highest === undefined ? undefined : `highest use ${useText(highest)}, ${escapeHtml(highest.name)}.`;
}

/** Three decimals, and more where they would hide whether the limit is passed. */
export function useText({ utilisation = 0, status }: Answer): string {
  for (let decimals = 3; decimals < 9; decimals++) {
    const text = utilisation.toFixed(decimals);
    if (Number(text) !== 1 || utilisation === 1 || status === 'none') return text;
  }
  return String(utilisation);
}

function named(state: 'not met' | 'withheld', words: string, answers: readonly Answer[]): string {
  const names = listed(answers.map(({ name }) => escapeHtml(name)));
  return `<span class="tl-nowrap">${stateMark(state)}<b>${words}</b></span> ${names}.`;
}

/** The method's first, then the writer's. Sentences, as HTML. */
function assumptions(result: StructureResult): string[] {
  const { structure, analysis } = result;
  const method = ['Linear elastic, first order, small movements.'];
  if (structure !== undefined) method.push(...methodOf(structure));
  if (analysis?.stability.stable === true) method.push(redundancyWords(analysis.redundancy));
  const own = result.assumptions.map(text => escapeHtml(sentence(text)));
  return [...method.map(plainHtml), ...(own.length === 0 ? [] : ['<b>Assumed:</b>', ...own])];
}

function methodOf(structure: Structure): string[] {
  const members = structure.members.filter(({ kind }) => kind === 'member');
  const sentences: string[] = [];
  const stiff = structure.members.filter(({ legs }) =>
    legs.every(leg => structure.sections[leg.section]?.axialStiffness === undefined),
  );
  if (members.length > 0) {
    const isBending = stiff.length === structure.members.length;
    const shears = structure.sections.some(({ shearStiffness }) => shearStiffness !== undefined);
    if (shears) sentences.push(isBending ? 'Bending and shear deformation.' : 'Bending, shear and axial deformation.');
    else {
      const what = isBending ? 'Bending only' : 'Bending and axial deformation';
      sentences.push(`${what}; shear deformation is not counted.`);
    }
    if (stiff.length > 0 && !isBending) {
      const names = stiff.length > 6 ? `${stiff.length} members` : listed(stiff.map(({ name }) => name));
      sentences.push(
        `${names} ${stiff.length === 1 ? 'keeps its' : 'keep their'} length: no axial stiffness is given.`,
      );
    }
  }
  if (members.length < structure.members.length) sentences.push('Bars carry axial force only.');
  if (structure.sections.some(({ description }) => SHARP.test(description))) {
    sentences.push('Sections with sharp corners, no root radius.');
  }
  const assumed = structure.sections.filter(
    ({ sectionModulusAssumed, sectionModulus }) => sectionModulusAssumed === true && sectionModulus !== undefined,
  );
  if (assumed.length > 0) {
    sentences.push(`The modulus of ${listed(assumed.map(({ name }) => name))} is taken as 2 I / depth.`);
  }
  return sentences;
}

const SHARP = /\b(?:box|i-shape|channel|tee)\b/;

function redundancyWords(redundancy: number): string {
  if (redundancy === 0) return 'Statically determinate.';
  const times = ['', 'Once', 'Twice'][redundancy] ?? `${redundancy} times`;
  return `${times} statically indeterminate.`;
}

/** With a capital and a full stop. */
export function sentence(text: string): string {
  const trimmed = text.trim();
  const capital = trimmed.charAt(0).toUpperCase() + trimmed.slice(1);
  return /[.!?…]$/.test(capital) ? capital : `${capital}.`;
}
