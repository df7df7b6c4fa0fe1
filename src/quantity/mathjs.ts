// The one door to mathjs: its expression parser, given node classes of our own. No evaluator, no unit type and no
// function of that library is built, so an expression can be read but nothing can be run.

import { createParse } from 'mathjs/number';

// The library exports the factory but does not declare it.
declare module 'mathjs/number' {
  export function createParse(dependencies: object): (text: string) => object;
}

/** The shape of an expression over symbols; what the parser leaves when spelling and blanks are gone. */
export type Shape =
  | { readonly kind: 'symbol'; readonly name: string }
  | { readonly kind: 'operator'; readonly operator: string; readonly of: readonly Shape[] }
  | { readonly kind: 'call'; readonly name: string; readonly of: readonly Shape[] }
  | { readonly kind: 'parenthesis'; readonly of: Shape };

/** Reads a text of symbols, + - * / ^, parentheses and calls, known to be well formed. The parser is made on first use. */
export function parseShape(text: string): Shape {
  parse ??= createParse(DEPENDENCIES);
  return (parse(text) as ShapeNode).shape;
}

let parse: ((text: string) => object) | undefined;

/** What mathjs builds instead of its own nodes. It recognises a node by `isNode` on the prototype. */
abstract class ShapeNode {
  abstract readonly shape: Shape;
  get isNode(): true {
    return true;
  }
}

class SymbolNode extends ShapeNode {
  readonly isSymbolNode = true;
  readonly name: string;
  constructor(name: string) {
    super();
    this.name = name;
  }
  get shape(): Shape {
    return { kind: 'symbol', name: this.name };
  }
}

class OperatorNode extends ShapeNode {
  readonly isOperatorNode = true;
  readonly op: string;
  readonly args: readonly ShapeNode[];
  readonly shape: Shape;
  constructor(op: string, _name: string, args: readonly ShapeNode[]) {
    super();
    this.op = op;
    this.args = args;
    this.shape = { kind: 'operator', operator: op, of: args.map(node => node.shape) };
  }
}

class FunctionNode extends ShapeNode {
  readonly isFunctionNode = true;
  readonly shape: Shape;
  constructor(fn: SymbolNode, args: readonly ShapeNode[]) {
    super();
    this.shape = { kind: 'call', name: fn.name, of: args.map(node => node.shape) };
  }
}

class ParenthesisNode extends ShapeNode {
  readonly isParenthesisNode = true;
  readonly shape: Shape;
  constructor(content: ShapeNode) {
    super();
    this.shape = { kind: 'parenthesis', of: content.shape };
  }
}

/** Stands for every node that the checks before this door keep from arising. */
class NeverNode {
  constructor() {
    throw new Error('an expression reached the parser with more than symbols, operators, parentheses and calls');
  }
}

const never = () => new NeverNode();

const DEPENDENCIES = {
  typed: Object.assign(
    (_name: string, signatures: { readonly string: (text: string) => object }) => signatures.string,
    {
      addConversion: () => undefined,
    },
  ),
  numeric: never,
  config: {},
  SymbolNode,
  OperatorNode,
  FunctionNode,
  ParenthesisNode,
  AccessorNode: NeverNode,
  ArrayNode: NeverNode,
  AssignmentNode: NeverNode,
  BlockNode: NeverNode,
  ConditionalNode: NeverNode,
  ConstantNode: NeverNode,
  FunctionAssignmentNode: NeverNode,
  IndexNode: NeverNode,
  ObjectNode: NeverNode,
  RangeNode: NeverNode,
  RelationalNode: NeverNode,
};
