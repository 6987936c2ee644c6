/** Checks the inputs of a method against its fields. Every fault is told, each with the place it stands in. */
import { describe, isInRange, rangeWords } from "../number-range";
import type { CompositionField, Field, NumberField, NumbersField } from "./field";
import type { Method } from "./method";

export type InputProblem = { path: string; message: string };
export type ReadInputs =
  { ok: true; inputs: Readonly<Record<string, unknown>> } | { ok: false; problems: readonly InputProblem[] };

export function readInputs(method: Method, given: Readonly<Record<string, unknown>>): ReadInputs {
  const problems: InputProblem[] = [];
  const inputs: Record<string, unknown> = {};
  for (const key of Object.keys(given)) {
    if (!Object.hasOwn(method.inputs, key))
      problems.push({
        path: `inputs.${key}`,
        message: `"${key}" is no input of ${method.id}. Its inputs are ${Object.keys(method.inputs).join(", ")}.`,
      });
  }
  for (const [key, field] of Object.entries(method.inputs)) {
    const value = Object.hasOwn(given, key) ? given[key] : undefined;
    const path = `inputs.${key}`;
    if (value === undefined || value === null) {
      if ("default" in field && field.default !== undefined) inputs[key] = field.default;
      else if (!("optional" in field)) problems.push({ path, message: `This is missing. ${wanted(field)}` });
      continue;
    }
    const found = faults(field, value, path);
    if (found.length === 0) inputs[key] = value;
    problems.push(...found);
  }
  return problems.length === 0 ? { ok: true, inputs } : { ok: false, problems };
}

function faults(field: Field, value: unknown, path: string): InputProblem[] {
  switch (field.kind) {
    case "number":
      return numberFault(field, value, path);
    case "choice":
      return field.choices.some((choice) => choice === value) ? [] : [{ path, message: `${describe(value)} ${wanted(field)}` }];
    case "numbers": {
      if (!Array.isArray(value) || value.length < field.fewest || value.length > field.most)
        return [{ path, message: `${describe(value)} ${wanted(field)}` }];
      return value.flatMap((one: unknown, at) => numberFault(field, one, `${path}[${at}]`));
    }
    case "composition":
      return compositionFaults(field, value, path);
  }
}

function numberFault(field: NumberField | NumbersField, value: unknown, path: string): InputProblem[] {
  if (typeof value !== "number" || !Number.isFinite(value))
    return [{ path, message: `${describe(value)} Give a number ${rangeWords(field)}.` }];
  return isInRange(value, field) ? [] : [{ path, message: `${value} is out of range. Give a number ${rangeWords(field)}.` }];
}

function compositionFaults(field: CompositionField, value: unknown, path: string): InputProblem[] {
  if (typeof value !== "object" || value === null || Array.isArray(value) || Object.keys(value).length === 0)
    return [{ path, message: `${describe(value)} ${wanted(field)}` }];
  const entries = Object.entries(value as Record<string, unknown>);
  const wrong = entries.filter(([, part]) => typeof part !== "number" || !(part >= 0 && part <= 1));
  if (wrong.length > 0)
    return wrong.map(([id, part]) => ({ path: `${path}.${id}`, message: `${describe(part)} Give a mole fraction from 0 to 1.` }));
  const sum = entries.reduce((total, [, part]) => total + (part as number), 0);
  return Math.abs(sum - 1) <= 1e-6
    ? []
    : [{ path, message: `The mole fractions sum to ${sum}. Make them sum to 1 within 1e-6.` }];
}

function wanted(field: Field): string {
  switch (field.kind) {
    case "number":
      return `Give a number ${rangeWords(field)}.`;
    case "choice":
      return `Give one of ${field.choices.map((choice) => `"${choice}"`).join(", ")}.`;
    case "numbers":
      return `Give a list of ${field.fewest} to ${field.most} numbers ${rangeWords(field)}.`;
    case "composition":
      return 'Give mole fractions by component id, such as { "methane": 0.9, "ethane": 0.1 }.';
  }
}
