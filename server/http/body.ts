import express, { type RequestHandler } from 'express';
import { AppError } from '@/server/errors';

/** Deepest nesting of arrays and objects taken: a layout document needs less than 12. */
const deepest = 64;

const quote = 0x22;
const backslash = 0x5c;

/** Counts nesting without building anything, so that a document of brackets alone cannot exhaust the stack later. */
const refuseDeep = (bytes: Buffer): void => {
  let depth = 0;
  let quoted = false;
  for (let at = 0; at < bytes.length; at++) {
    const byte = bytes[at];
    if (quoted) {
      if (byte === backslash) at++;
      else if (byte === quote) quoted = false;
    } else if (byte === quote) quoted = true;
    else if (byte === 0x7b || byte === 0x5b) {
      if (++depth > deepest) throw new AppError('body-too-deep', { message: `At most ${deepest} levels.` });
    } else if (byte === 0x7d || byte === 0x5d) depth--;
  }
};

/**
 * Refuses a body that says it is too long, before any of it is read: the reader itself would answer only after the
 * last byte has come.
 */
const refuseLong =
  (bytes: number): RequestHandler =>
  (req, _res, next) => {
    if (Number(req.headers['content-length'] ?? 0) > bytes) throw tooLarge(bytes);
    next();
  };

/** The problem of a body with more than `bytes` bytes. */
export const tooLarge = (bytes: number): AppError =>
  new AppError('body-too-large', { message: `At most ${bytes.toLocaleString('en')} bytes are taken here.` });

/** Reads a JSON body of at most `bytes` bytes (after unpacking); refuses other kinds, and nesting beyond 64 levels. */
export const readJson = (bytes: number): RequestHandler[] => [
  (req, _res, next) => {
    const hasBody = req.headers['transfer-encoding'] !== undefined || Number(req.headers['content-length'] ?? 0) > 0;
    if (hasBody && !req.is(['json', '+json'])) throw new AppError('unsupported-media-type');
    next();
  },
  refuseLong(bytes),
  express.json({
    limit: bytes,
    strict: false,
    type: ['json', '+json'],
    verify: (_req, _res, buffer) => refuseDeep(buffer),
  }),
];
