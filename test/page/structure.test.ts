import { describe, expect, it } from 'vitest';
import { checkTags } from '../drawing/svg.ts';
import { CANTILEVER, fenced, RAFTER, render, rowsOf, STYLESHEET, section, wordsOf } from './notes.ts';

describe('the head line', () => {
  it('counts the requirements and names the ones not met', () => {
    expect(wordsOf(render(RAFTER))).toContain('2 of 3 requirements met, highest use 0.333, mid. Not met: seat.');
  });

  it('says so where nothing is required', () => {
    expect(wordsOf(render(fenced(CANTILEVER)))).toContain('No requirement asked.');
  });

  it('tells the assumptions of the method and of the writer', () => {
    const words = wordsOf(render(RAFTER));
    expect(words).toContain('Linear elastic, first order, small movements. Bending and axial deformation;');
    expect(words).toContain('Statically determinate. Assumed: Lifted only by wind.');
    expect(wordsOf(render(fenced(CANTILEVER)))).toContain('Bending only; shear deformation is not counted.');
  });
});

describe('the answers', () => {
  const html = render(RAFTER);
  const rows = rowsOf(section(html, 'Answers'));

  it('stand in the writer’s words with place, limit and state', () => {
    expect(rows).toEqual([
      ['tip', 'deflection at C under service at most span B–C 1.800 m / 180 = 10.00 mm', '1.649 mm up', '0.165', 'met'],
      [
        'mid',
        'sag of R1 between A and B under service at most span A–B 4.800 m / 360 = 13.33 mm brief, 3.2',
        '4.443 mm 2.224 m from A',
        '0.333',
        'met',
      ],
      ['seat', 'reaction at A under uplift at least 0 kN', '0.9981 kN, holds down', 'margin −0.9981 kN', 'not met'],
      ['slope', 'rotation at C under service no limit asked', '0.0005924 rad anticlockwise', '', 'not checked'],
    ]);
  });

  it('tell the state by a mark as well as by a word, and never by colour', () => {
    expect(section(html, 'Answers').match(/class="tl-mark"/g)).toHaveLength(4);
    expect(html).toContain('<tr class="tl-fails">');
  });

  it('draw the use as a bar to the limit', () => {
    // 0.3332 × 48 px
    expect(section(html, 'Answers').match(/width="[\d.]+" height="5"/g)).toContain('width="16.00" height="5"');
  });

  it('say what the checks left, and which limits have no source', () => {
    expect(wordsOf(section(html, 'Answers'))).toMatch(/Equilibrium leaves at most \d × 10−\d+ of the loads\./);
    expect(wordsOf(section(html, 'Answers'))).toContain('The limits of tip and seat have no source.');
  });

  it('show more digits where four would hide that a limit is passed', () => {
    const note = fenced(`${CANTILEVER}require tip: deflection at B <= 1.99999 mm`);
    const [row] = rowsOf(section(render(note), 'Answers'));
    expect(row?.slice(2)).toEqual(['2.00000 mm down', '1.00001', 'not met']);
    expect(wordsOf(render(note))).toMatch(/all stiffness must rise by a factor of 1\.00/);
  });

  it('that are withheld say why', () => {
    const [row] = rowsOf(section(render(fenced(`${CANTILEVER}find x: deflection at Z`)), 'Answers'));
    expect(row?.[2]).toMatch(/Z/);
    expect(row?.[4]).toBe('withheld');
  });

  it('name the alternative that governs', () => {
    const note = fenced(
      `${CANTILEVER}combine strength (a): 1.35 live\ncombine strength (b): 1.5 live\nfind bend: moment at A in B1 under strength`,
    );
    const [row] = rowsOf(section(render(note), 'Answers'));
    // 1.5 × 3 kN × 2 m
    expect(row?.[2]).toBe('9.000 kN m, tension above strength (b)');
  });
});

describe('the reactions', () => {
  const html = section(render(RAFTER), 'Reactions');

  it('stand beside the sums of loads and reactions, case by case', () => {
    const rows = rowsOf(html);
    expect(rows.map(([name]) => name)).toEqual([
      'dead',
      'snow',
      'wind',
      'lamp',
      'service dead + snow + lamp',
      'uplift dead + wind',
    ]);
    // The lamp alone, by hand: B = 0.45 × 6.6 / 4.8, A = 0.45 − B; 0.45 × 6.6 about A.
    expect(rows[3]).toEqual(['lamp', '−0.1688', '0.6188', '0.4500', '0.4500', '2.970', '2.970']);
  });

  it('say where a support holds down, and that nothing is level', () => {
    expect(wordsOf(html)).toContain('No support carries a level force.');
    expect(wordsOf(html)).toContain('Minus in an upward reaction means that the support holds down.');
  });

  it('have columns for level forces and moments where there are any', () => {
    const note = fenced(`${CANTILEVER}load push: 2 kN right at B\n`);
    const words = wordsOf(section(render(note), 'Reactions'));
    expect(words).toContain('Reactions, up, kN');
    expect(words).toContain('Reactions, to the right, kN');
    expect(words).toContain('Reactions, anticlockwise, kN m');
    expect(words).toContain('loads, to the right reactions, to the left');
  });

  it('head their rows and columns for a reader that cannot see them', () => {
    expect(html).toContain('<th scope="colgroup" colspan="2">');
    expect(html.match(/<th scope="row"/g)).toHaveLength(6);
    expect(html.match(/<th scope="col">/g)).toHaveLength(7);
  });
});

describe('the inputs', () => {
  const html = render(RAFTER);
  const inputs = html.slice(
    html.indexOf('<details class="tl-inputs">'),
    html.indexOf('</details>', html.indexOf('tl-inputs')),
  );

  it('are folded, and counted in the head', () => {
    expect(wordsOf(inputs)).toContain('Inputs 1 section, 4 cases, 2 combinations; 4 loads without a source');
  });

  it('give sections, loads with their sums and sources, and factors', () => {
    const words = wordsOf(inputs);
    // A = 0.1 × 0.2 − 0.088 × 0.188; W = I / 0.1 m
    expect(words).toContain('RHS box 100 mm × 200 mm × 6 mm, S355; of R1 210 GPa 34.56 cm² 1794 cm⁴ 179.4 cm³');
    expect(words).toContain('1.15 kN/m down on R1 7.590 supplier');
    expect(words).toContain('service dead + snow + lamp unfactored');
    expect(words).not.toContain('alpha');
  });

  it('give the depth and the expansion where something is heated', () => {
    const heated = render(
      fenced(`${CANTILEVER.replace('EI 4 MN m2', 'EI 4 MN m2, depth 0.3 m, alpha 12e-6 /K')}
load sun: heat B1 by 30 K above, 5 K below "local practice"`),
    );
    const words = wordsOf(heated);
    expect(words).toContain('self-weight depth alpha');
    expect(words).toContain('0.3000 m 12e-6 /K');
    expect(words).toContain('sun heat B1 by 30 K above, 5 K below – local practice');
  });
});

describe('what was not looked at', () => {
  it('names the method’s limits, unasked uplift, questions without a limit, and missing sources', () => {
    const words = wordsOf(section(render(RAFTER), 'Not looked at'));
    expect(words).toContain('Buckling, lateral torsion, connections, second-order effects.');
    expect(words).toContain('Strength: no requirement asks');
    expect(words).toMatch(/Uplift at B: no requirement asks it, and under uplift it holds down 2\.196 kN\./);
    expect(words).toContain('No limit: slope.');
    expect(words).toContain('No source: 4 loads and 2 limits.');
    expect(words).toContain('support a qualified engineer’s judgement');
  });
});

describe('the choice of combination', () => {
  it('is a row of radio buttons, the first chosen, read by the stylesheet alone', () => {
    const html = render(RAFTER);
    const names = [
      ...html.matchAll(
        /<input type="radio" name="tautline-1" id="tautline-1-\d+"( checked)?><label for="[^"]+">([^<]+)</g,
      ),
    ];
    expect(names.map(([, checked, name]) => `${name}${checked ?? ''}`)).toEqual([
      'service checked',
      'uplift',
      'dead',
      'snow',
      'wind',
      'lamp',
    ]);
    expect(html).not.toMatch(/<script|onclick|onchange/);
    expect(STYLESHEET).toContain('.tautline .tl-pick > input:checked + label + .tl-plate');
  });

  it('is left out where there is nothing to choose', () => {
    expect(render(fenced(CANTILEVER))).not.toContain('type="radio"');
  });
});

describe('show', () => {
  const titles = (statements: string): string[] =>
    [...render(fenced(CANTILEVER + statements)).matchAll(/<(?:h3|summary)>([^<]+)</g)].map(([, title = '']) =>
      title.trim(),
    );

  it('chooses what the page shows, and its order', () => {
    expect(titles('find tip: deflection at B\nshow: reactions by case\nshow: results\nshow: inputs')).toEqual([
      'As written, 9 lines',
      'Reactions',
      'Answers',
      'Inputs',
      'Not looked at',
    ]);
  });

  it('draws one field of one member', () => {
    const html = render(fenced(`${CANTILEVER}show: moment in B1 under live`));
    // 3 kN × 2 m
    expect(section(html, 'Moment in B1')).toContain('6.000\u2009kN\u2009m, tension above');
  });

  it('draws an envelope, each extreme with its alternative', () => {
    const html = render(
      fenced(`${CANTILEVER}combine c (a): live\ncombine c (b): - 2 live\nshow: envelope of moment in B1 under c`),
    );
    const part = section(html, 'Envelope of moment in B1');
    expect(part).toContain('6.000\u2009kN\u2009m, tension above, c (a)');
    expect(part).toContain('12.00\u2009kN\u2009m, tension below, c (b)');
  });

  it('says which alternative gives an envelope, stretch by stretch', () => {
    const html = render(
      fenced(`section S: EI 4 MN m2
member B1: A -- 4 m -- B
support A: pinned
support B: roller
load near: 4 kN down at 1 m from A on B1
load far: 4 kN down at 3 m from A on B1
combine c (p): near
combine c (q): far
show: envelope of moment in B1 under c`),
    );
    const part = section(html, 'Envelope of moment in B1');
    // 4 kN·m − x meets x at 2 m; at the loads 3 kN m.
    expect(part).toContain('Greatest: c (p) to 2.000\u2009m from A; c (q) from there on.');
    expect(part).toContain('Least: c (q) to 2.000\u2009m from A; c (p) from there on.');
    expect(part).toContain('3.000\u2009kN\u2009m, tension below, c (p)');
  });

  it('draws the envelope of a patterned load with its spans', () => {
    const html = render(
      fenced(`section S: EI 4 MN m2
member B1: A -- 4 m -- B -- 4 m -- C
support A: pinned
support B: roller
support C: roller
load live: 3 kN/m down on B1, patterned
show: envelope of moment in B1 under live`),
    );
    const part = section(html, 'Envelope of moment in B1');
    // wL²/8 with both spans; 49/512 wL² with one.
    expect(part).toContain('6.000\u2009kN\u2009m, tension above, live on A–B, B–C');
    expect(part).toContain('4.594\u2009kN\u2009m, tension below, 1.750\u2009m from ');
  });

  it('says what this version does not draw', () => {
    expect(wordsOf(render(fenced(`${CANTILEVER}find tip: deflection at B\nshow: working of tip`)))).toContain(
      'working of tip: not drawn by this version.',
    );
  });
});

describe('what is wrong', () => {
  it('stands at its fence with its line and its hint', () => {
    const html = render(`text\n\n${fenced(`${CANTILEVER}combin x: live`)}`);
    expect(wordsOf(html)).toContain('Error, line 9. combin begins no statement.');
    expect(wordsOf(html)).toContain('combine?');
  });

  it('of a structure that is not held is drawn beside its words', () => {
    const html = render(
      fenced(
        'structure Loose\nsection H: EI 4 MN m2\nmember B1, H: A -- 2 m -- B\nsupport A: roller\nload dead: 1 kN down at B',
      ),
    );
    checkTags(html);
    expect(section(html, 'Not held')).toContain('free to move');
    expect(wordsOf(section(html, 'Not held'))).toContain('Each of these was tried and holds it');
    expect(wordsOf(section(html, 'Not held'))).toContain('withheld');
    expect(html).not.toContain('<h3>Reactions');
    expect(html.match(/data-code="unstable-structure"/g)).toBeNull();
  });
});

describe('text of a note', () => {
  const nasty = '</style><script>alert(1)</script><b onmouseover="x">&';

  it('is escaped wherever the page shows it', () => {
    const html = render(
      fenced(
        [
          `structure Beam "${nasty.replaceAll('"', "'")}"`,
          'section H: EI 4 MN m2',
          'member B1, H: A -- 2 m -- B',
          'support A: fixed',
          `case live "${nasty.replaceAll('"', "'")}"`,
          `load live: 3 kN down at B "${nasty.replaceAll('"', "'")}"`,
          `assume: "${nasty.replaceAll('"', "'")}"`,
          `let q = 2 m "${nasty.replaceAll('"', "'")}"`,
          `require tip: deflection at B <= 3 mm "${nasty.replaceAll('"', "'")}"`,
          nasty,
        ].join('\n'),
      ),
    );
    checkTags(html);
    expect(html).not.toMatch(/<script|<b /);
  });
});

describe('the stylesheet', () => {
  it('knows every class that the page writes', () => {
    const html = [RAFTER, fenced(CANTILEVER)].map(render).join('');
    const used = new Set([...html.matchAll(/class="([^"]*)"/g)].flatMap(([, names = '']) => names.split(' ')));
    const plain = ['tl-keep', 'tl-answers', 'tl-inputs', 'tl-state', 'tl-points'];
    for (const name of used) {
      if (name === '' || plain.includes(name)) continue;
      expect(STYLESHEET, name).toContain(`.${name}`);
    }
  });

  it('touches nothing outside its own blocks', () => {
    const rules = STYLESHEET.replace(/\/\*[\s\S]*?\*\//g, '').replace(/@(?:media|supports)[^{]+\{/g, '');
    const selectors = [...rules.matchAll(/([^{}]+)\{[^{}]*\}/g)].map(([, selector = '']) => selector.trim());
    expect(selectors.length).toBeGreaterThan(50);
    for (const selector of selectors.flatMap(one => one.split(/,(?![^(]*\))/))) {
      expect(selector.trim()).toMatch(
        /^(?:body[.[][\w-]+\]? |body\.[\w-]+ )?(?:\.tautline\b|\.tautline-|output\.tautline-)/,
      );
    }
  });
});
