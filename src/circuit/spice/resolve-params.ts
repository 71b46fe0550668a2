import { NotchworkError, type TextPlace } from '../../errors.ts';
import { type Expression, evaluateExpression } from './expression.ts';
import type { LabelComment } from './label-comment.ts';
import type { NetlistCard, NetlistParam } from './netlist.ts';

/** A parameter as read, its value not yet known. */
export interface ParamDefinition {
  readonly name: string;
  readonly expression: Expression;
  readonly place: TextPlace;
  readonly comment: LabelComment;
}

/** Smallest number but 0 that is taken for a knob's position rather than a part's value. */
const SMALLEST_POSITION = 1e-6;

function fail(place: TextPlace, message: string): never {
  throw new NotchworkError('netlist-syntax', `line ${place.line}, column ${place.column}: ${message}`, {
    place,
  });
}

/** Refuses names that no `.param` defines, wherever they are used. */
function checkNames(expressions: readonly Expression[], known: ReadonlyMap<string, ParamDefinition>): void {
  for (const { program } of expressions) {
    for (const instruction of program) {
      if (!('parameter' in instruction) || known.has(instruction.parameter)) continue;
      const names = [...known.values()].map((definition) => definition.name).join(', ');
      fail(
        instruction.place,
        `found “${instruction.parameter}”, expected a parameter that a .param line defines; there are ${names || 'none'}.`,
      );
    }
  }
}

/** Looks parameters up by name in lower case, each calculated at most once from those it refers to. */
export function parameterLookup(
  params: readonly { readonly name: string; readonly expression: Expression; readonly place: TextPlace }[],
  given: ReadonlyMap<string, number>,
): (name: string) => number {
  const values = new Map(given);
  const byName = new Map(params.map((param) => [param.name.toLowerCase(), param]));
  const underway = new Set<string>();
  const lookUp = (name: string): number => {
    const value = values.get(name);
    if (value !== undefined) return value;
    const param = byName.get(name)!;
    if (underway.has(name)) fail(param.place, `parameter ${param.name} depends on itself; break the circle.`);
    underway.add(name);
    const fresh = evaluateExpression(param.expression, lookUp, `parameter ${param.name}`);
    underway.delete(name);
    values.set(name, fresh);
    return fresh;
  };
  return lookUp;
}

function isKnobValue({ literal }: Expression, value: number): boolean {
  return literal === 'plain' && (value === 0 || (value >= SMALLEST_POSITION && value <= 1));
}

/**
 * Calculates the parameters in any order of definition, and tells knobs from plain parameters.
 *
 * @throws NotchworkError `netlist-syntax` for an unknown name, a circle, or a taper or `knob=yes` on a
 *   parameter that is no number from 0 to 1; `value-out-of-range` for a division by zero.
 */
export function resolveParams(
  definitions: readonly ParamDefinition[],
  cards: readonly NetlistCard[],
): readonly NetlistParam[] {
  const known = new Map(definitions.map((definition) => [definition.name.toLowerCase(), definition]));
  checkNames([...definitions.map(({ expression }) => expression), ...cards.map(({ value }) => value)], known);
  const lookUp = parameterLookup(definitions, new Map());
  return definitions.map(({ name, expression, place, comment }): NetlistParam => {
    const value = lookUp(name.toLowerCase());
    const isKnob = comment.isKnob ?? (comment.taper !== undefined || isKnobValue(expression, value));
    if (isKnob && (expression.literal === 'none' || !(value >= 0 && value <= 1))) {
      fail(place, `a knob is one number from 0 to 1, and ${name} is “${expression.text}”.`);
    }
    if (!isKnob && comment.taper !== undefined) fail(place, `${name} is no knob, so it has no taper.`);
    return {
      name,
      value,
      expression,
      isKnob,
      place,
      ...(comment.label !== undefined && { label: comment.label }),
      ...(comment.taper !== undefined && { taper: comment.taper }),
    };
  });
}
