/** From outside text to a validated study: every refusal says which key, what was found and what is allowed. */

import { closest, distance } from 'fastest-levenshtein';
import type { z } from 'zod';
import { InputProblem, type StudyProblem } from './problem';
import { crossFieldProblems } from './rules';
import { STUDY_FORMAT, type Study, studySchema } from './schema';

/** Largest study text accepted, characters. Tables beyond this belong in files of their own. */
export const MAX_STUDY_TEXT = 8_000_000;

/**
 * Reads a study from JSON text.
 * @throws InputProblem naming the file, the key or the line, and what is allowed.
 */
export function parseStudy(text: string, file?: string): Study {
  if (text.length > MAX_STUDY_TEXT)
    throw new InputProblem(`the study has ${text.length} characters; at most ${MAX_STUDY_TEXT} are read`, {
      file,
    });
  const body = text.charCodeAt(0) === 0xfeff ? text.slice(1) : text;
  if (body.trim() === '')
    throw new InputProblem('the file is empty; a study is a JSON object that begins with "format"', { file });
  let value: unknown;
  try {
    value = JSON.parse(body, refuseHostileKeys);
  } catch (error) {
    if (error instanceof InputProblem) throw new InputProblem(error.message, { file, ...error.place });
    throw new InputProblem(`not valid JSON: ${(error as Error).message.replace(/\s+/g, ' ')}`, {
      file,
      line: lineOfJsonError(body, error as Error),
    });
  }
  return validateStudy(value, file);
}

/**
 * Validates an already parsed value.
 * @throws InputProblem for the first problem found.
 */
export function validateStudy(value: unknown, file?: string): Study {
  const checked = check(value);
  if (Array.isArray(checked)) {
    const [first] = checked;
    const more = checked.length > 1 ? ` (and ${checked.length - 1} more)` : '';
    throw new InputProblem(first.message + more, { file, key: first.key || undefined });
  }
  return checked;
}

/** All problems of a value at once; none when it is a valid study. */
export function studyProblems(value: unknown): StudyProblem[] {
  const checked = check(value);
  return Array.isArray(checked) ? checked : [];
}

function check(value: unknown): Study | StudyProblem[] {
  const formatProblem = checkFormat(value);
  if (formatProblem) return [formatProblem];
  const parsed = studySchema.safeParse(value, { reportInput: true });
  if (!parsed.success) return parsed.error.issues.map((issue) => describe(issue));
  const crossed = crossFieldProblems(parsed.data);
  return crossed.length > 0 ? crossed : parsed.data;
}

function checkFormat(value: unknown): StudyProblem | undefined {
  if (typeof value !== 'object' || value === null || Array.isArray(value))
    return { key: '', message: `a study is a JSON object; found ${shown(value)}` };
  const { format } = value as { format?: unknown };
  if (format === STUDY_FORMAT) return undefined;
  const version = typeof format === 'string' ? /^ohmstrata-study\/(\d+)$/.exec(format) : null;
  if (version)
    return {
      key: 'format',
      message: `this study has format version ${version[1]}; this program reads version 1: open it with a newer Ohmstrata`,
    };
  return { key: 'format', message: `found ${shown(format)}; allowed is "${STUDY_FORMAT}"` };
}

function refuseHostileKeys(key: string, value: unknown): unknown {
  if (key === '__proto__' || key === 'constructor' || key === 'prototype')
    throw new InputProblem(`the key "${key}" is not allowed in a study`, { key });
  return value;
}

function lineOfJsonError(text: string, error: Error): number {
  const at = /position (\d+)/.exec(error.message);
  const position = at ? Number(at[1]) : text.length;
  return text.slice(0, position).split(/\r\n|\n|\r/).length;
}

function keyOf(path: readonly PropertyKey[]): string {
  return path.reduce<string>(
    (key, part) =>
      typeof part === 'number' ? `${key}[${part}]` : key === '' ? String(part) : `${key}.${String(part)}`,
    '',
  );
}

function shown(value: unknown): string {
  if (value === undefined) return 'nothing';
  if (typeof value === 'number') return String(value);
  const text = JSON.stringify(value) ?? String(value);
  return text.length > 60 ? `${text.slice(0, 57)}...` : text;
}

function describe(issue: z.core.$ZodIssue): StudyProblem {
  const key = keyOf(issue.path);
  const found = shown(issue.input);
  switch (issue.code) {
    case 'unrecognized_keys': {
      const unknown = issue.keys[0];
      return {
        key: keyOf([...issue.path, unknown]),
        message: `unknown key "${unknown}"${nearest(unknown, issue)}`,
      };
    }
    case 'invalid_type':
      return issue.input === undefined
        ? { key, message: `missing; a ${plainType(issue.expected)} is needed` }
        : { key, message: `found ${found}; a ${plainType(issue.expected)} is needed` };
    case 'too_small':
      return {
        key,
        message: `found ${found}; the smallest allowed is ${issue.minimum}${countable(issue.origin)}`,
      };
    case 'too_big':
      return {
        key,
        message: `found ${found}; the largest allowed is ${issue.maximum}${countable(issue.origin)}`,
      };
    case 'invalid_value':
      return { key, message: `found ${found}; allowed: ${issue.values.map(String).join(', ')}` };
    case 'invalid_union':
      return issue.discriminator
        ? { key, message: `unknown step ${found}; allowed: ${STEP_KINDS.join(', ')}` }
        : { key, message: `found ${found}; allowed: ${alternatives(issue)}` };
    case 'invalid_key':
      return { key, message: `"${String(issue.path.at(-1))}" is not a name that is allowed here` };
    default:
      return { key, message: `found ${found}; ${issue.message}` };
  }
}

const STEP_KINDS = studySchema.shape.steps.unwrap().element.options.map((option) => option.shape.step.value);

function plainType(expected: string): string {
  return expected === 'int' ? 'whole number' : expected === 'array' ? 'list' : expected;
}

function countable(origin: string): string {
  return origin === 'array' ? ' entries' : origin === 'string' ? ' characters' : '';
}

function alternatives(issue: z.core.$ZodIssueInvalidUnion): string {
  const texts = issue.errors
    .flat()
    .map((inner) =>
      inner.code === 'invalid_value'
        ? inner.values.map(String).join(', ')
        : inner.code === 'invalid_type'
          ? `a ${plainType(inner.expected === 'record' ? 'fraction for each dopant' : inner.expected)}`
          : inner.message,
    );
  return [...new Set(texts)].join('; or ');
}

/** The allowed key nearest to an unknown one, looked up where the unknown key stands. */
function nearest(unknown: string, issue: z.core.$ZodIssueUnrecognizedKeys): string {
  const allowed = allowedKeys(issue);
  if (allowed.length === 0) return '';
  const best = closest(unknown, allowed);
  const hint = distance(unknown, best) <= Math.max(2, unknown.length / 2) ? `; did you mean "${best}"?` : '';
  return `${hint || ';'} allowed: ${allowed.join(', ')}`;
}

function allowedKeys(issue: z.core.$ZodIssueUnrecognizedKeys): string[] {
  const { shape } = studySchema;
  const [head, index, inner] = issue.path;
  if (head === undefined) return Object.keys(shape);
  if (head === 'wafer') return Object.keys(shape.wafer.shape);
  if (head === 'models') return Object.keys(shape.models.unwrap().shape);
  if (head === 'measurements') return Object.keys(shape.measurements.unwrap().element.shape);
  if (head !== 'steps' || index === undefined) return [];
  const { step } = (inner === undefined ? issue.input : {}) as { step?: string };
  const option = shape.steps
    .unwrap()
    .element.options.find((candidate) => candidate.shape.step.value === step);
  return option ? Object.keys(option.shape) : [];
}
