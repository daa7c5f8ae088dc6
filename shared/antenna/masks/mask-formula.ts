/*
 * A level as a formula in the off-axis angle: numbers, theta (degrees), + - * / ^, brackets and the functions below, in
 * the syntax of mathjs. Nothing can be assigned, defined, indexed or looked up, and there is one variable, so a formula
 * costs at most its length. The angle functions take radians, as mathjs has them.
 */

export const LONGEST_FORMULA = 200;
const MOST_NODES = 120;
const DEEPEST = 24;

export type MaskFormula =
  | { readonly kind: 'formula'; readonly levelDb: (thetaDeg: number) => number }
  | { readonly kind: 'fault'; readonly detail: string };

type Node = (theta: number) => number;

const FUNCTIONS: Readonly<Record<string, { readonly arguments: readonly [least: number, most: number]; readonly of: (...values: number[]) => number }>> = {
  abs: { arguments: [1, 1], of: Math.abs },
  sqrt: { arguments: [1, 1], of: Math.sqrt },
  exp: { arguments: [1, 1], of: Math.exp },
  log: { arguments: [1, 1], of: Math.log },
  log10: { arguments: [1, 1], of: Math.log10 },
  log2: { arguments: [1, 1], of: Math.log2 },
  sin: { arguments: [1, 1], of: Math.sin },
  cos: { arguments: [1, 1], of: Math.cos },
  tan: { arguments: [1, 1], of: Math.tan },
  min: { arguments: [1, 8], of: Math.min },
  max: { arguments: [1, 8], of: Math.max },
};
const CONSTANTS: ReadonlyMap<string, number> = new Map([['pi', Math.PI], ['e', Math.E]]);

export const FORMULA_WORDS = ['theta', ...CONSTANTS.keys(), ...Object.keys(FUNCTIONS)];

class FormulaFault extends Error {}

/** Reads a formula; what is not in the list above is refused with its place. */
export function maskFormula(text: string): MaskFormula {
  if (text.length > LONGEST_FORMULA) return { kind: 'fault', detail: `must have at most ${LONGEST_FORMULA} characters; got ${text.length}` };
  try {
    return { kind: 'formula', levelDb: new FormulaReader(text).read() };
  } catch (error) {
    if (error instanceof FormulaFault) return { kind: 'fault', detail: error.message };
    throw error;
  }
}

/** Reads by descent: sum, product, sign, power, atom. */
class FormulaReader {
  private at = 0;
  private nodes = 0;
  private depth = 0;

  constructor(private readonly text: string) {}

  read(): Node {
    const node = this.sum();
    if (this.peek() !== '') throw this.fault(`"${this.peek()}" is not expected`);
    return node;
  }

  private sum(): Node {
    return this.deeper(() => {
      let left = this.product();
      for (;;) {
        if (this.takes('+')) left = this.combined(left, this.product(), (a, b) => a + b);
        else if (this.takes('-')) left = this.combined(left, this.product(), (a, b) => a - b);
        else return left;
      }
    });
  }

  private product(): Node {
    let left = this.signed();
    for (;;) {
      if (this.takes('*')) left = this.combined(left, this.signed(), (a, b) => a * b);
      else if (this.takes('/')) left = this.combined(left, this.signed(), (a, b) => a / b);
      else return left;
    }
  }

  /** A sign binds less than a power: -2^2 is -4. */
  private signed(): Node {
    return this.deeper(() => {
      if (this.takes('+')) return this.signed();
      if (!this.takes('-')) return this.power();
      const node = this.signed();
      return this.counted((theta) => -node(theta));
    });
  }

  /** Powers join from the right: 2^3^2 is 2^9. */
  private power(): Node {
    const base = this.atom();
    return this.takes('^') ? this.combined(base, this.signed(), (a, b) => a ** b) : base;
  }

  private atom(): Node {
    const number = /^(?:\d+(?:\.\d*)?|\.\d+)(?:[eE][+-]?\d+)?/.exec(this.rest());
    if (number) {
      this.at += number[0].length;
      const value = Number(number[0]);
      return this.counted(() => value);
    }
    if (this.takes('(')) {
      const node = this.sum();
      this.demand(')');
      return node;
    }
    const word = /^[A-Za-z_][A-Za-z0-9_]*/.exec(this.rest());
    if (!word) throw this.fault(this.peek() === '' ? 'the formula ends too early' : `"${this.peek()}" is not expected`);
    return this.named(word[0]);
  }

  private named(word: string): Node {
    const constant = CONSTANTS.get(word);
    const called = Object.hasOwn(FUNCTIONS, word) ? FUNCTIONS[word] : undefined;
    if (word !== 'theta' && constant === undefined && called === undefined) throw this.fault(`"${word}" is not known; known are ${FORMULA_WORDS.join(', ')}`);
    this.at += word.length;
    if (called === undefined) return this.counted(word === 'theta' ? (theta) => theta : () => constant ?? 0);
    this.demand('(');
    const given = [this.sum()];
    while (this.takes(',')) given.push(this.sum());
    this.demand(')');
    const [least, most] = called.arguments;
    if (given.length < least || given.length > most) throw this.fault(`${word} takes ${least === most ? least : `${least} to ${most}`} values; got ${given.length}`);
    return this.counted((theta) => called.of(...given.map((node) => node(theta))));
  }

  private combined(left: Node, right: Node, of: (a: number, b: number) => number): Node {
    return this.counted((theta) => of(left(theta), right(theta)));
  }

  private counted(node: Node): Node {
    this.nodes += 1;
    if (this.nodes > MOST_NODES) throw this.fault(`the formula has more than ${MOST_NODES} parts`);
    return node;
  }

  private deeper(inner: () => Node): Node {
    this.depth += 1;
    if (this.depth > 2 * DEEPEST) throw this.fault(`brackets and signs are nested more than ${DEEPEST} deep`);
    const node = inner();
    this.depth -= 1;
    return node;
  }

  private demand(sign: string): void {
    if (!this.takes(sign)) throw this.fault(this.peek() === '' ? `"${sign}" is missing` : `"${sign}" is expected, not "${this.peek()}"`);
  }

  private takes(sign: string): boolean {
    if (this.peek() !== sign) return false;
    this.at += 1;
    return true;
  }

  private rest(): string {
    while (this.at < this.text.length && /\s/.test(this.text[this.at])) this.at += 1;
    return this.text.slice(this.at);
  }

  private peek(): string {
    return this.rest().slice(0, 1);
  }

  private fault(what: string): FormulaFault {
    return new FormulaFault(`${what}, at character ${this.at + 1}`);
  }
}
