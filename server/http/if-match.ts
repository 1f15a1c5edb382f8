import type { Request } from 'express';
import { AppError } from '@/server/errors';

/** The version that a change is meant for, from If-Match: "<version>"; throws `version-required` when it is missing. */
export const requiredVersion = (request: Request): number => {
  const version = /^(?:W\/)?"(\d{1,9})"$/.exec(request.headers['if-match'] ?? '')?.[1];
  if (version === undefined) throw new AppError('version-required');
  return Number(version);
};

/** The ETag header of a version. */
export const versionTag = (version: number): Record<string, string> => ({ ETag: `"${version}"` });
