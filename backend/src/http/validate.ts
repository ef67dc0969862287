import type { ProblemIssue } from '@tiltwright/shared/schemas/problem.ts';
import * as z from 'zod';
import { ApiProblem } from '../errors.ts';

/** Parses a JSON body. @throws ApiProblem invalid-input with one issue a field, by JSON Pointer */
export function parseBody<S extends z.ZodType>(schema: S, body: unknown): z.output<S> {
  const parsed = schema.safeParse(body);
  if (parsed.success) return parsed.data;
  const issues = parsed.error.issues.flatMap((issue) => flatten(issue, body)).map((issue) => toIssue(issue, 'pointer'));
  throw new ApiProblem('invalid-input', sentence(issues), issues);
}

/** Parses query or path parameters, which arrive as words. @throws ApiProblem unknown-parameter or invalid-input */
export function parseParameters<S extends z.ZodObject>(schema: S, raw: Record<string, unknown>): z.output<S> {
  const unknown = Object.keys(raw).filter((name) => !Object.hasOwn(schema.shape, name));
  if (unknown.length > 0) {
    const known = Object.keys(schema.shape).join(', ') || 'none';
    const issues = unknown.map((name) => ({ path: name, code: 'unknown-parameter', message: `Known here: ${known}.` }));
    throw new ApiProblem('unknown-parameter', `Not a parameter of this address: ${unknown.join(', ')}.`, issues);
  }
  const parsed = schema.safeParse(
    Object.fromEntries(Object.entries(raw).map(([name, value]) => [name, fromWord(schema.shape[name]!, value)])),
  );
  if (parsed.success) return parsed.data;
  const issues = parsed.error.issues.map((issue) => toIssue(issue, 'name'));
  throw new ApiProblem('invalid-input', sentence(issues), issues);
}

/** Numbers and truth values are written as words in an address; everything else stays as it is. */
function fromWord(schema: z.core.$ZodType, value: unknown): unknown {
  if (typeof value !== 'string') return value;
  const inner = innermost(schema);
  if (inner instanceof z.ZodNumber) return /^[-+]?(\d+\.?\d*|\.\d+)(e[-+]?\d+)?$/i.test(value) ? Number(value) : value;
  if (inner instanceof z.ZodBoolean) return value === 'true' ? true : value === 'false' ? false : value;
  return value;
}

function innermost(schema: z.core.$ZodType): z.core.$ZodType {
  if (schema instanceof z.ZodOptional || schema instanceof z.ZodDefault || schema instanceof z.ZodNullable)
    return innermost(schema.unwrap());
  return schema;
}

type Issue = z.core.$ZodIssue;

/** A part is an id or a record: of the two complaints, show the one about what the caller wrote. */
function flatten(issue: Issue, body: unknown): Issue[] {
  if (issue.code !== 'invalid_union' || issue.errors.length === 0) return [issue];
  const value = issue.path.reduce<unknown>((at, key) => (at as Record<PropertyKey, unknown> | undefined)?.[key], body);
  const wanted = typeof value === 'object' && value !== null ? issue.errors.find((branch) => !isWrongTypeAtTop(branch)) : undefined;
  const branch = wanted ?? issue.errors[0]!;
  return branch.flatMap((inner) => flatten(inner, value)).map((inner) => ({ ...inner, path: [...issue.path, ...inner.path] }) as Issue);
}

const isWrongTypeAtTop = (branch: readonly Issue[]) => branch.some((issue) => issue.code === 'invalid_type' && issue.path.length === 0);

function toIssue(issue: Issue, style: 'pointer' | 'name'): ProblemIssue {
  const keys = issue.code === 'unrecognized_keys' ? [...issue.path, issue.keys[0]!] : issue.path;
  const path =
    style === 'pointer'
      ? keys.map((key) => `/${String(key).replaceAll('~', '~0').replaceAll('/', '~1')}`).join('')
      : keys.map(String).join('.');
  const message = messageOf(issue);
  return { path, code: issue.code.replaceAll('_', '-'), message };
}

function messageOf(issue: Issue): string {
  if (issue.code === 'unrecognized_keys') return `Not a field here: ${issue.keys.join(', ')}.`;
  if (issue.code === 'invalid_type')
    return issue.message.endsWith('received undefined') ? 'This is missing.' : `A ${issue.expected} is wanted here.`;
  if (issue.code === 'too_small' && issue.origin === 'number') return `Out of range: at least ${issue.minimum} is wanted.`;
  if (issue.code === 'too_big' && issue.origin === 'number') return `Out of range: at most ${issue.maximum} is allowed.`;
  if (issue.code === 'invalid_value') return `One of ${issue.values.map(String).join(', ')} is wanted here.`;
  return issue.message;
}

function sentence(issues: readonly ProblemIssue[]): string {
  const first = issues[0]!;
  const more = issues.length > 1 ? ` (and ${issues.length - 1} more)` : '';
  return `${first.path || 'The body'}: ${first.message}${more}`;
}
