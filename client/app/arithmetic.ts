/** A number typed without a unit, or an amount of one unit. Amounts with a unit are in the field's base unit. */
type Term =
  { readonly unit: null; readonly amount: number } | { readonly unit: string; readonly amount: number };

export interface UnitTable {
  /** Factor from the named unit to the base unit; names in lower case. */
  readonly factors: ReadonlyMap<string, number>;
  /** The unit of a bare number that stands beside one with a unit. */
  readonly bareUnit: string;
}

/** Why a typed quantity cannot be read: a sentence for the person who typed it. */
export class ArithmeticError extends Error {
  override readonly name = 'ArithmeticError';
}

type Token =
  | { readonly kind: 'number'; readonly value: number }
  | { readonly kind: 'unit'; readonly name: string }
  | { readonly kind: 'sign'; readonly sign: string };

const TOKEN = /\s*(?:(\d+(?:[.,]\d+)?|[.,]\d+)|([a-zµ]+|%|°|"|″)|([-+*/()−–×·÷]))/iy;
const SIGNS: Readonly<Record<string, string>> = { '−': '-', '–': '-', '×': '*', '·': '*', '÷': '/' };

/**
 * Reads sums, products and brackets of numbers with units: "12+0.4", "2*1.1 %", "3/8 in", "(4 + 2) mm".
 * A product has a unit on one side only; a bare number may be added to one with a unit only where that unit is the
 * field's own, because a guess would be silent. Throws ArithmeticError.
 */
export function evaluate(text: string, units: UnitTable): Term {
  return new Reader(tokensOf(text), units).whole();
}

function tokensOf(text: string): readonly Token[] {
  const tokens: Token[] = [];
  TOKEN.lastIndex = 0;
  let read = 0;
  while (read < text.trimEnd().length) {
    TOKEN.lastIndex = read;
    const match = TOKEN.exec(text);
    if (!match) throw new ArithmeticError(`"${text.slice(read).trim().charAt(0)}" cannot be read here.`);
    const [, number, unit, sign] = match;
    if (number !== undefined) tokens.push({ kind: 'number', value: numberOf(number) });
    else if (unit !== undefined) tokens.push({ kind: 'unit', name: unit.toLowerCase() });
    else if (sign !== undefined) tokens.push({ kind: 'sign', sign: SIGNS[sign] ?? sign });
    read = TOKEN.lastIndex;
  }
  return tokens;
}

/** A comma is a decimal sign, except where it could as well part the thousands: that is refused, not guessed. */
function numberOf(text: string): number {
  if (/^[1-9]\d{0,2},\d{3}$/.test(text)) {
    throw new ArithmeticError(
      `${text} can be read in two ways: type ${text.replace(',', '')} or ${text.replace(',', '.')}.`,
    );
  }
  return Number(text.replace(',', '.'));
}

class Reader {
  readonly #tokens: readonly Token[];
  readonly #units: UnitTable;
  #next = 0;

  constructor(tokens: readonly Token[], units: UnitTable) {
    this.#tokens = tokens;
    this.#units = units;
  }

  whole(): Term {
    const term = this.#sum();
    const rest = this.#tokens[this.#next];
    if (rest)
      throw new ArithmeticError(
        rest.kind === 'number' ? 'A sign is missing between two numbers.' : 'This does not read as a sum.',
      );
    return term;
  }

  #sign(...wanted: string[]): string | null {
    const token = this.#tokens[this.#next];
    if (token?.kind !== 'sign' || !wanted.includes(token.sign)) return null;
    this.#next += 1;
    return token.sign;
  }

  #sum(): Term {
    let term = this.#product();
    for (let sign = this.#sign('+', '-'); sign !== null; sign = this.#sign('+', '-')) {
      term = add(term, this.#product(), sign === '+' ? 1 : -1, this.#units);
    }
    return term;
  }

  #product(): Term {
    let term = this.#signed();
    for (let sign = this.#sign('*', '/'); sign !== null; sign = this.#sign('*', '/')) {
      const right = this.#signed();
      term = sign === '*' ? multiply(term, right) : divide(term, right, this.#units);
    }
    return term;
  }

  #signed(): Term {
    const sign = this.#sign('+', '-');
    const term = this.#withUnit();
    return sign === '-' ? { ...term, amount: -term.amount } : term;
  }

  #withUnit(): Term {
    const term = this.#single();
    const token = this.#tokens[this.#next];
    if (token?.kind !== 'unit') return term;
    this.#next += 1;
    const factor = this.#units.factors.get(token.name);
    if (factor === undefined)
      throw new ArithmeticError(
        `"${token.name}" is no unit here. Use ${[...this.#units.factors.keys()].slice(0, 4).join(', ')}.`,
      );
    if (term.unit !== null) throw new ArithmeticError('A number can have one unit only.');
    return { unit: token.name, amount: term.amount * factor };
  }

  #single(): Term {
    const token = this.#tokens[this.#next];
    if (token?.kind === 'number') {
      this.#next += 1;
      return { unit: null, amount: token.value };
    }
    if (this.#sign('(') !== null) {
      const term = this.#sum();
      if (this.#sign(')') === null) throw new ArithmeticError('A closing bracket is missing.');
      return term;
    }
    throw new ArithmeticError('A number is missing.');
  }
}

function add(left: Term, right: Term, sign: 1 | -1, units: UnitTable): Term {
  if ((left.unit === null) === (right.unit === null))
    return { ...left, amount: left.amount + sign * right.amount };
  const factor = units.factors.get(units.bareUnit) ?? 1;
  const unit = left.unit ?? right.unit;
  if (unit === null || units.factors.get(unit) !== factor)
    throw new ArithmeticError('Write the unit after each number of the sum.');
  const inBase = (term: Term) => (term.unit === null ? term.amount * factor : term.amount);
  return { unit, amount: inBase(left) + sign * inBase(right) };
}

function multiply(left: Term, right: Term): Term {
  if (left.unit !== null && right.unit !== null)
    throw new ArithmeticError('Only one side of a product can have a unit.');
  const unit = left.unit ?? right.unit;
  return { unit, amount: left.amount * right.amount } as Term;
}

/** "3/8 in" is three eighths of an inch: the unit at the end belongs to the fraction. */
function divide(left: Term, right: Term, units: UnitTable): Term {
  if (right.amount === 0) throw new ArithmeticError('A division by zero has no result.');
  if (right.unit === null) return { ...left, amount: left.amount / right.amount };
  if (left.unit !== null) return { unit: null, amount: left.amount / right.amount };
  const factor = units.factors.get(right.unit) ?? 1;
  return { unit: right.unit, amount: (left.amount / (right.amount / factor)) * factor };
}
