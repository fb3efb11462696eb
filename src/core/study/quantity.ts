/** What a person types into a quantity field: a number or a short sum, in the unit shown or in one typed beside it. */

import { convert, namedUnit, plainSpelling, type QuantityKind, type Unit, unitAt, unitNames } from './units';

export type ParsedQuantity = { value: number; unitTyped?: string } | { problem: string };

interface Field {
  /** Unit beside the field; a bare number means this one. Ignored for plain numbers. */
  shown: string;
  kind: QuantityKind;
}

/** A number in the unit shown; `unit` is the one typed with it, if any. */
interface Term {
  value: number;
  unit?: Unit;
}

/** Raised inside the parser and turned into the field's message. */
class Refusal extends Error {}

const LONGEST = 200;

/**
 * Reads `120 nm`, `0.3um`, `1.2e13*2`, `1,2e13`, `2 h 30 min`, `300 K`, `1e21 m-3`, `(3 + 4) / 2 um`.
 *
 * A bare number means the unit shown; a typed unit wins. One comma is a decimal comma unless exactly three digits follow,
 * which is refused as ambiguous.
 * @returns the value in the unit shown, or what is wrong and what is allowed.
 */
export function parseQuantity(text: string, field: Field): ParsedQuantity {
  if (text.trim() === '') return { problem: `a value is missing; ${example(field)}` };
  if (text.length > LONGEST) return { problem: `too long; ${example(field)}` };
  try {
    const { value, unit } = new Parser(plainSpelling(text).trim(), field).whole();
    if (!Number.isFinite(value)) throw new Refusal(`"${text.trim()}" is not a finite number`);
    return unit ? { value, unitTyped: unit.name } : { value };
  } catch (error) {
    if (error instanceof Refusal) return { problem: error.message };
    throw error;
  }
}

function example({ shown, kind }: Field): string {
  if (kind === 'plain') return 'type a number';
  return `type a number in ${shown}, or with one of the units ${unitNames(kind).join(', ')}`;
}

const NUMBER = /(?:\d+(?:[.,]\d*)*|[.,]\d+)(?:[eEdD][+-]?\d+| ?[xX*] ?10\^\(?[+-]?\d+\)?)?/y;

/** Recursive descent: sum = product {(+|-) product}; product = factor {(*|/) factor}; factor = sign, number or brackets, then a unit. */
class Parser {
  private at = 0;
  private readonly text: string;
  private readonly field: Field;
  private readonly shown: Unit | undefined;

  constructor(text: string, field: Field) {
    this.text = text;
    this.field = field;
    this.shown = field.kind === 'plain' ? undefined : namedUnit(field.shown);
  }

  whole(): Term {
    const term = this.sum();
    this.blanks();
    if (this.at < this.text.length)
      throw new Refusal(`"${this.text.slice(this.at)}" is not understood; ${example(this.field)}`);
    return term;
  }

  private sum(): Term {
    let left = this.product();
    for (;;) {
      const sign = this.take('+', '-');
      if (!sign && !(left.unit && this.field.kind === 'time' && this.startsNumber())) return left;
      const right = this.product();
      if ((left.unit === undefined) !== (right.unit === undefined))
        throw new Refusal('give the unit of every part of a sum, or of none');
      refuseTemperature(left, right);
      left = {
        value: tidy(sign === '-' ? left.value - right.value : left.value + right.value),
        unit: left.unit,
      };
    }
  }

  private product(): Term {
    let left = this.factor();
    for (;;) {
      const sign = this.take('*', '/');
      if (!sign) return left;
      const right = this.factor();
      if (right.unit && (left.unit || sign === '/'))
        throw new Refusal('only one part of a product may carry a unit, and none may stand below a division');
      refuseTemperature(left, right);
      const value = sign === '*' ? left.value * right.value : left.value / right.value;
      left = { value: tidy(value), unit: left.unit ?? right.unit };
    }
  }

  private factor(): Term {
    if (this.take('+')) return this.factor();
    if (this.take('-')) return this.negative();
    return this.withUnit(this.bare());
  }

  /** The sign belongs to the number, before its unit: -10 C is ten degrees below zero. */
  private negative(): Term {
    const inner = this.bare();
    return this.withUnit({ ...inner, value: -inner.value });
  }

  private bare(): Term {
    if (!this.take('(')) return { value: this.number() };
    const inner = this.sum();
    if (!this.take(')')) throw new Refusal('a closing bracket is missing');
    return inner;
  }

  private number(): number {
    this.blanks();
    NUMBER.lastIndex = this.at;
    const found = NUMBER.exec(this.text)?.[0];
    if (found === undefined) {
      const rest = this.text.slice(this.at);
      throw new Refusal(
        rest === ''
          ? `a number is missing at the end; ${example(this.field)}`
          : `a number is expected where "${rest}" stands; ${example(this.field)}`,
      );
    }
    this.at += found.length;
    return numberOf(found);
  }

  private withUnit(term: Term): Term {
    this.blanks();
    const found = unitAt(this.text, this.at, this.field.kind);
    if (!found) return term;
    const { unit, length } = found;
    if (unit.kind !== this.field.kind || !this.shown)
      throw new Refusal(`${unit.name} is no unit of this field; ${example(this.field)}`);
    if (term.unit) throw new Refusal('a unit stands both inside and behind the brackets; give one');
    this.at += length;
    return { value: unit === this.shown ? term.value : tidy(convert(term.value, unit, this.shown)), unit };
  }

  private startsNumber(): boolean {
    this.blanks();
    return /[\d.,(]/.test(this.text.charAt(this.at));
  }

  private take(...signs: string[]): string | undefined {
    this.blanks();
    const sign = this.text.charAt(this.at);
    if (sign === '' || !signs.includes(sign)) return undefined;
    this.at++;
    return sign;
  }

  private blanks(): void {
    while (this.text.charAt(this.at) === ' ') this.at++;
  }
}

/** Removes what binary fractions leave behind: 0.1 + 0.02 is 0.12. A number typed as it is keeps all its digits. */
function tidy(value: number): number {
  return Number(value.toPrecision(15));
}

function refuseTemperature(...terms: Term[]): void {
  if (terms.some((term) => term.unit?.kind === 'temperature'))
    throw new Refusal(
      'a temperature with its unit stands alone; put the unit behind the brackets, as in (900 + 50) C',
    );
}

function numberOf(text: string): number {
  const [digits, exponent = '0'] = text.split(/[eEdD]| ?[xX*] ?10\^/);
  const signs = digits.replace(/\d/g, '');
  if (signs.length > 1)
    throw new Refusal(
      `"${digits}" has ${signs.length} decimal signs; write the number without signs between thousands`,
    );
  if (signs === ',' && exponent === '0' && /^[1-9]\d{0,2},\d{3}$/.test(digits))
    throw new Refusal(
      `"${digits}" can mean ${digits.replace(',', '.')} or ${digits.replace(',', '')}; write one of these`,
    );
  return Number(`${digits.replace(',', '.')}e${exponent.replace(/[()]/g, '')}`);
}

/**
 * A number for a field or a reading, without its unit: `1.2e13` for concentrations and doses, plain digits otherwise
 * between 1e-4 and 1e6.
 * @param digits significant digits, trailing zeros kept; absent: the shortest that read back the same.
 */
export function formatQuantity(value: number, kind: QuantityKind = 'plain', digits?: number): string {
  if (!Number.isFinite(value)) return String(value);
  const size = Math.abs(value);
  const powers = kind === 'concentration' || kind === 'dose';
  const scientific = value !== 0 && (powers ? size >= 1e4 || size < 1e-3 : size >= 1e6 || size < 1e-4);
  if (scientific)
    return value.toExponential(digits === undefined ? undefined : digits - 1).replace('e+', 'e');
  if (digits === undefined) return String(value);
  const rounded = value.toPrecision(digits);
  return rounded.includes('e') ? String(Number(rounded)) : rounded;
}
