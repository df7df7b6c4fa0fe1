// The notes of the benches, made from rows, so that every run reads the same text.

/** A beam of one span, a line load and a question. */
export function smallNote() {
  return `# Shelf

\`\`\`tautline
section P: solid 47 mm x 220 mm, E 11 GPa
member B1, P: A -- 3.6 m -- B
support A: pinned
support B: roller
load shelf: 1.2 kN/m down on B1
require mid: deflection of B1 <= span/300 "client brief"
\`\`\`

It gives by \`tautline mid\`.
`;
}

/** 300 lines: prose, tables, fifty values, and a frame of nine points (27 degrees of freedom) with two combinations. */
export function longNote() {
  const lines = ['# Boat store, portal and lean-to', '', 'All loads are from the client brief.', '', ...frame(), ''];
  for (let section = 1; section <= 10; section += 1) lines.push(...chapter(section));
  while (lines.length < 299) lines.push('A line of prose that says what the next page of the drawing set shows.');
  return `${lines.slice(0, 299).join('\n')}\n`;
}

function frame() {
  return [
    '```tautline',
    'structure Portal "Portal and lean-to"',
    'material S355: E 210 GPa, density 7850 kg/m3',
    'section Post: box 150 mm x 150 mm x 8 mm, S355',
    'section Raf: i-shape 254 mm x 146 mm x 8.6 mm x 6 mm, S355',
    'member C1, Post: A -- 3.5 m up -- B',
    'member C2, Post: E -- 3.5 m down -- F',
    'member R1, Raf: B -- 3 m right, 0.6 m up -- C -- 3 m right, 0.6 m down -- E',
    'member C3, Post: H -- 2.6 m down -- G',
    'member R2, Raf: J -- 1.5 m right, 0.2 m down -- K -- 1.5 m right, 0.2 m down -- H',
    'point A: 0 m, 0 m',
    'point E: 6 m, 3.5 m',
    'point J: 6 m, 3 m',
    'point H: 9 m, 2.6 m',
    'member S1, Post: E -- J',
    'support A: fixed',
    'support F: fixed',
    'support G: pinned',
    'load dead: self-weight',
    'load dead: 1.2 kN/m down on R1, R2',
    'load snow: (w_snow) down on plan R1, R2',
    'load wind: 0.9 kN/m right on C1',
    'combine service: dead + snow',
    'combine strength (a): 1.35 dead + 1.5 snow',
    'combine strength (b): 1.35 dead + 1.5 snow + 0.9 wind',
    'let w_snow = 0.6000 kN/m2 * 4 m',
    'find ridge: deflection at C under service',
    'require drift: sway at B under strength <= 3.5 m / 150 "brief, 2.1"',
    'require eaves: moment in R1 under strength <= 60 kN m "section table"',
    '```',
  ];
}

function chapter(number) {
  const row = index => `let v${number}_${index} = ${number}.${index} kN/m2 * (3.2 m + ${index} * 0.15 m) / sqrt(2)`;
  return [
    `## ${number} Purlins, bay ${number}`,
    '',
    'The purlins carry the sheeting; their spacing follows the sheeting table, and the rails do the same below.',
    'Nothing here depends on the frame above.',
    '',
    '| item | figure |',
    '| --- | --- |',
    `| bay | ${number} |`,
    '| pitch | 11.3 |',
    '',
    '```tautline',
    ...[1, 2, 3, 4, 5].map(row),
    '```',
    '',
    `The first comes to \`tautline v${number}_1\`, the last to \`tautline v${number}_5\`.`,
    '',
    '- sheeting as the drawing says',
    '- rails at 1.2 m',
    '',
  ];
}
