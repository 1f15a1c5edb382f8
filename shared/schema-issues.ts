import type { z } from 'zod';

/** One thing that a schema finds wrong, at one place. */
export interface SchemaIssue {
  readonly path: readonly PropertyKey[];
  readonly code: string;
  readonly message: string;
}

/** JSON pointer (RFC 6901) of a path into a document; "" is the whole. */
export const pointerOf = (path: readonly PropertyKey[]): string =>
  path.map((step) => `/${String(step).replaceAll('~', '~0').replaceAll('/', '~1')}`).join('');

/**
 * Zod's issues as one a place: a field too many is told at that field, and of the ways in which a union can be
 * read only the one that comes nearest is told.
 */
export const flattenIssues = (issues: readonly z.core.$ZodIssue[]): SchemaIssue[] => issues.flatMap(flatten);

const flatten = (issue: z.core.$ZodIssue): SchemaIssue[] => {
  const { path, code, message } = issue;
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({ path: [...path, key], code, message: 'There is no such field.' }));
  }
  if (issue.code === 'invalid_union') return flattenUnion(issue);
  return [{ path, code, message }];
};

const flattenUnion = ({ path, code, message, errors }: z.core.$ZodIssueInvalidUnion): SchemaIssue[] => {
  const ways = errors.map((way) => way.map((inner) => ({ ...inner, path: [...path, ...inner.path] })));
  const near = ways.filter((way) => !way.some((inner) => inner.path.length === path.length && ofOtherType(inner)));
  const [nearest] = near.sort((a, b) => a.length - b.length);
  if (nearest) return flattenIssues(nearest);
  const wanted = ways.flatMap((way) => way.flatMap((inner) => wantedBy(inner)));
  return [{ path, code, message: wanted.length ? `Expected ${[...new Set(wanted)].join(' or ')}.` : message }];
};

const ofOtherType = ({ code }: z.core.$ZodIssue): boolean => code === 'invalid_type' || code === 'invalid_value';

const wantedBy = (issue: z.core.$ZodIssue): string[] => {
  if (issue.code === 'invalid_type') return [issue.expected];
  return issue.code === 'invalid_value' ? issue.values.map((value) => JSON.stringify(value)) : [];
};
