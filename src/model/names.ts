// Resolves names in a pass of its own: where each is defined, where it is used, and what nothing defines. Whoever builds
// a structure afterwards may take every name that does not resolve as already reported.
import type { Diagnostic } from '../language/diagnostic.ts';
import type { Name, Statement } from '../language/syntax.ts';
import { nearest } from '../quantity/nearest.ts';
import type { Range } from '../quantity/range.ts';
import { type NameUse, type Sought, usesIn } from './name-uses.ts';
import type { Scope, Scopes } from './scope.ts';

export type Namespace =
  | 'structure'
  | 'point'
  | 'member'
  | 'section'
  | 'material'
  | 'case'
  | 'combination'
  | 'value'
  | 'result';

/** One name with all its places: what hover, completion, go-to-definition and rename read. */
export interface NameEntry {
  readonly namespace: Namespace;
  readonly name: string;
  /** Name of the structure that owns it; undefined for the note's head. */
  readonly structure: string | undefined;
  /** Where it is defined first (for a point: first named in a chain or placed). */
  readonly definition: Range;
  readonly uses: readonly Range[];
}

export interface Definition extends NameEntry {
  readonly scope: Scope;
  readonly statement: Statement;
  readonly uses: Range[];
}

export interface Names {
  readonly entries: readonly Definition[];
  readonly diagnostics: readonly Diagnostic[];
  /** What a use in a scope means: looked for there, then in the head. */
  readonly find: (scope: Scope, sought: readonly Namespace[], name: string) => Definition | undefined;
  /** Resolves uses outside statements, in a value in prose; what is unknown is returned. */
  readonly useInProse: (scope: Scope, uses: readonly NameUse[]) => Diagnostic[];
}

export function resolveNames(scopes: Scopes): Names {
  const names = new NameTable(scopes);
  const all = [scopes.head, ...scopes.structures];
  for (const scope of all) names.define(scope);
  for (const scope of all) {
    for (const statement of scope.statements) {
      for (const use of usesIn(statement)) names.use(scope, use);
    }
  }
  return {
    entries: names.entries,
    diagnostics: names.diagnostics,
    find: (scope, sought, name) => names.find(scope, sought, name),
    useInProse: (scope, uses) => {
      const known = names.diagnostics.length;
      for (const use of uses) names.use(scope, use);
      return names.diagnostics.splice(known);
    },
  };
}

/** What a word may mean, by what is sought. */
const SOUGHT = {
  point: ['point'],
  member: ['member'],
  section: ['section'],
  material: ['material'],
  case: ['case'],
  'combination or case': ['combination', 'case'],
  'value or result': ['value', 'result'],
  result: ['result'],
  owner: ['section', 'material', 'structure'],
} as const satisfies Record<Sought, readonly Namespace[]>;

class NameTable {
  readonly entries: Definition[] = [];
  readonly diagnostics: Diagnostic[] = [];
  readonly #scopes: Scopes;
  readonly #tables = new Map<Scope, Map<string, Definition>>();

  constructor(scopes: Scopes) {
    this.#scopes = scopes;
    for (const scope of [scopes.head, ...scopes.structures]) this.#tables.set(scope, new Map());
  }

  define(scope: Scope): void {
    for (const statement of scope.statements) this.#defineIn(scope, statement);
    // A case exists as soon as a load names it, unless a `case` statement gives it a title anywhere in reach.
    for (const statement of scope.statements) {
      if (statement.kind !== 'load' || this.find(scope, ['case'], statement.case.text) !== undefined) continue;
      this.#clash(scope, statement.case, ['combination'], 'a case and a combination');
      this.#add(scope, 'case', statement.case, statement);
    }
  }

  find(scope: Scope, sought: readonly Namespace[], name: string): Definition | undefined {
    for (const table of [this.#tables.get(scope), this.#tables.get(this.#scopes.head)]) {
      for (const namespace of sought) {
        const found = table?.get(key(namespace, name));
        if (found !== undefined) return found;
      }
    }
    return sought.includes('structure') ? this.#structure(name) : undefined;
  }

  use(scope: Scope, { sought, name, property }: NameUse): void {
    const found = sought === 'case' ? this.#cases(scope, name.text) : this.#one(scope, SOUGHT[sought], name.text);
    for (const definition of found) {
      if (!sameRange(definition.definition, name.range)) definition.uses.push(name.range);
    }
    if (found.length === 0) this.#unknown(scope, sought, name);
    if (property !== undefined && found[0]?.namespace === 'structure') this.#useIn(found[0], property);
  }

  #one(scope: Scope, sought: readonly Namespace[], name: string): Definition[] {
    const found = this.find(scope, sought, name);
    return found === undefined ? [] : [found];
  }

  /** A combination of the head speaks of every structure's case of that name; one of a structure may name another's, which adds nothing. */
  #cases(scope: Scope, name: string): Definition[] {
    const own = this.find(scope, ['case'], name);
    if (own !== undefined && scope !== this.#scopes.head) return [own];
    const others = this.#scopes.structures.flatMap(other => this.#tables.get(other)!.get(key('case', name)) ?? []);
    return own === undefined ? others : [own, ...others];
  }

  /** `tip of Rafter`: the property is a value or a result of that structure. */
  #useIn(owner: Definition, property: Name): void {
    const scope = this.#scopes.structures.find(other => other.structure === owner.statement);
    if (scope === undefined) return;
    const table = this.#tables.get(scope)!;
    const found = table.get(key('value', property.text)) ?? table.get(key('result', property.text));
    if (found !== undefined) found.uses.push(property.range);
    else this.#unknown(scope, 'value or result', property);
  }

  #structure(name: string): Definition | undefined {
    for (const scope of this.#scopes.structures) {
      const found = this.#tables.get(scope)?.get(key('structure', name));
      if (found !== undefined) return found;
    }
    return undefined;
  }

  #defineIn(scope: Scope, statement: Statement): void {
    switch (statement.kind) {
      case 'structure':
        if (this.#structure(statement.name.text) !== undefined)
          this.#twice(this.#structure(statement.name.text)!, statement.name);
        else this.#clash(scope, statement.name, ['section', 'material'], 'a structure and a section or material');
        this.#add(scope, 'structure', statement.name, statement);
        return;
      case 'case':
        this.#clash(scope, statement.name, ['combination'], 'a case and a combination');
        this.#addOnce(scope, 'case', statement.name, statement);
        return;
      case 'material':
        this.#clash(scope, statement.name, ['section', 'structure'], 'a material and a section or structure');
        this.#addOnce(scope, 'material', statement.name, statement);
        return;
      case 'section':
        this.#clash(scope, statement.name, ['material', 'structure'], 'a section and a material or structure');
        this.#addOnce(scope, 'section', statement.name, statement);
        return;
      case 'let':
        this.#clash(scope, statement.name, ['result'], 'a value and a result', true);
        this.#addOnce(scope, 'value', statement.name, statement);
        return;
      case 'find':
      case 'require':
        this.#clash(scope, statement.name, ['value'], 'a result and a value', true);
        this.#addOnce(scope, 'result', statement.name, statement);
        return;
      case 'combine':
        this.#clash(scope, statement.name, ['case'], 'a combination and a case');
        this.#defineCombination(scope, statement);
        return;
      case 'group':
        this.#addOnce(scope, 'member', statement.name, statement);
        return;
      case 'member':
      case 'bar':
      case 'bars':
        this.#addOnce(scope, 'member', statement.name, statement);
        if (statement.kind === 'bars') {
          statement.chain.legs.forEach((leg, i) => {
            const name = { text: `${statement.name.text}${i + 1}`, range: leg.range };
            this.#addOnce(scope, 'member', { ...name, range: statement.name.range }, statement);
          });
        }
        for (const point of [statement.chain.first, ...statement.chain.legs.map(leg => leg.to)]) {
          this.#addFirst(scope, 'point', point, statement);
        }
        return;
      case 'point':
        this.#definePoint(scope, statement.name, statement);
        return;
      case 'use':
      case 'hinge':
      case 'connection':
      case 'release':
      case 'support':
      case 'load':
      case 'display':
      case 'assume':
      case 'show':
      case 'carry':
        return;
    }
  }

  #definePoint(scope: Scope, name: Name, statement: Statement): void {
    const found = this.#tables.get(scope)!.get(key('point', name.text));
    const placed = scope.statements.find(other => other.kind === 'point' && other.name.text === name.text);
    if (placed !== undefined && placed !== statement && placed.kind === 'point')
      this.#twice({ definition: placed.name.range, name: name.text }, name);
    else if (found !== undefined) found.uses.push(name.range);
    else this.#add(scope, 'point', name, statement);
  }

  #defineCombination(scope: Scope, statement: Extract<Statement, { kind: 'combine' }>): void {
    const { name, label } = statement;
    const first = scope.statements.find(
      other =>
        other.kind === 'combine' &&
        other.name.text === name.text &&
        (other.label?.text === label?.text || other.label === undefined || label === undefined),
    );
    if (first !== undefined && first !== statement && first.kind === 'combine') {
      const same = first.label?.text === label?.text;
      this.diagnostics.push({
        code: 'defined-twice',
        severity: 'error',
        range: (same ? label : undefined)?.range ?? name.range,
        message: same
          ? `${name.text}${label === undefined ? '' : ` (${label.text})`} has a combination already.`
          : `${name.text} stands with a label and without one.`,
        hint: `give each alternative of ${name.text} a label of its own: combine ${name.text} (a): …`,
        related: [{ range: first.name.range, message: 'The first one.' }],
      });
    }
    this.#addFirst(scope, 'combination', name, statement);
  }

  #add(scope: Scope, namespace: Namespace, name: Name, statement: Statement): void {
    const table = this.#tables.get(scope)!;
    const at = key(namespace, name.text);
    if (table.has(at)) return;
    const structure = scope === this.#scopes.head ? undefined : scope.name;
    const definition: Definition = {
      namespace,
      name: name.text,
      structure,
      definition: name.range,
      uses: [],
      scope,
      statement,
    };
    table.set(at, definition);
    this.entries.push(definition);
  }

  #addOnce(scope: Scope, namespace: Namespace, name: Name, statement: Statement): void {
    const found = this.#tables.get(scope)!.get(key(namespace, name.text));
    if (found !== undefined) this.#twice(found, name);
    else this.#add(scope, namespace, name, statement);
  }

  #addFirst(scope: Scope, namespace: Namespace, name: Name, statement: Statement): void {
    const found = this.#tables.get(scope)!.get(key(namespace, name.text));
    if (found !== undefined) found.uses.push(name.range);
    else this.#add(scope, namespace, name, statement);
  }

  #twice(first: { readonly definition: Range; readonly name: string }, name: Name): void {
    this.diagnostics.push({
      code: 'defined-twice',
      severity: 'error',
      range: name.range,
      message: `${name.text} is defined already.`,
      hint: 'give one of the two another name',
      related: [{ range: first.definition, message: `The first ${name.text}.` }],
    });
  }

  /** Two namespaces that must not share a name, since a use could mean either; `sameScope`: only within one owner. */
  #clash(scope: Scope, name: Name, others: readonly Namespace[], what: string, sameScope = false): void {
    const own = this.#tables.get(scope)!;
    const found = sameScope
      ? others.map(other => own.get(key(other, name.text))).find(other => other !== undefined)
      : this.find(scope, others, name.text);
    if (found === undefined) return;
    this.diagnostics.push({
      code: 'defined-twice',
      severity: 'error',
      range: name.range,
      message: `${name.text} would be ${what} of one name: a use of it could mean either.`,
      hint: 'give one of the two another name',
      related: [{ range: found.definition, message: `The other ${name.text}.` }],
    });
  }

  #unknown(scope: Scope, sought: Sought, name: Name): void {
    if (this.#mayBeBroken(scope, sought, name.text)) return;
    const reach = [this.#tables.get(scope)!, this.#tables.get(this.#scopes.head)!];
    if (sought === 'owner' || sought === 'case')
      reach.push(...this.#scopes.structures.map(other => this.#tables.get(other)!));
    const wanted: readonly Namespace[] = SOUGHT[sought];
    const known = new Set<string>();
    for (const table of reach)
      for (const entry of table.values()) if (wanted.includes(entry.namespace)) known.add(entry.name);
    const close = nearest(name.text, [...known]);
    const word = sought === 'owner' ? 'section, material or structure' : sought;
    this.diagnostics.push({
      code: 'unknown-name',
      severity: 'error',
      range: name.range,
      message: `No ${word} named ${name.text}.${close === undefined ? '' : ` Did you mean ${close}?`}`,
      ...(close === undefined
        ? {}
        : { fix: { title: `Change to ${close}`, edits: [{ range: name.range, text: close }] } }),
    });
  }

  /** Whether a line that could not be read may have defined the name; then that line's own diagnostic is enough. */
  #mayBeBroken(scope: Scope, sought: Sought, name: string): boolean {
    const scopes = scope === this.#scopes.head ? [scope] : [scope, this.#scopes.head];
    const brought = [this.#scopes.head, ...this.#scopes.structures].some(other =>
      other.statements.some(({ kind }) => kind === 'use' || kind === 'carry'),
    );
    if (brought) return true;
    const wide = sought === 'owner' || sought === 'case' ? [this.#scopes.head, ...this.#scopes.structures] : scopes;
    return wide.some(({ broken }) =>
      broken.some(({ keyword, name: defined }) => {
        const defines = DEFINED_BY[keyword];
        if (defines === undefined) return true;
        if (!defines.some(namespace => (SOUGHT[sought] as readonly Namespace[]).includes(namespace))) return false;
        return defines.includes('point') || keyword === 'bars' || defined === undefined || defined === name;
      }),
    );
  }
}

/** What each statement's keyword can define; a word that is none of them may have been meant as any. */
const DEFINED_BY: Readonly<Record<string, readonly Namespace[]>> = {
  structure: ['structure', 'value', 'result'],
  case: ['case'],
  material: ['material'],
  section: ['section'],
  let: ['value'],
  find: ['result'],
  require: ['result'],
  combine: ['combination'],
  group: ['member'],
  member: ['member', 'point'],
  bar: ['member', 'point'],
  bars: ['member', 'point'],
  point: ['point'],
  load: ['case'],
  hinge: [],
  connection: [],
  release: [],
  support: [],
  display: [],
  assume: [],
  show: [],
};

function key(namespace: Namespace, name: string): string {
  return `${namespace} ${name}`;
}

function sameRange(a: Range, b: Range): boolean {
  return a.start === b.start && a.end === b.end;
}
