import jwt from 'jsonwebtoken';
import { z } from 'zod';
import type { Config } from '@/server/config';
import { roleSchema, type Role } from '@/shared/roles';

interface Claims {
  readonly standing: Role;
  readonly userId: string;
  readonly sessionId: string;
}

const payload = z.object({ sub: z.uuid(), sid: z.uuid(), role: roleSchema });

const issuer = 'rowcall';

/** Signs an access token (JWT, HS256) for `config.tokens.accessMinutes` minutes from `now`. */
export const signAccessToken = (config: Config, claims: Claims, now: Date): { token: string; expiresAt: Date } => {
  const issued = Math.floor(now.getTime() / 1000);
  const expires = issued + config.tokens.accessMinutes * 60;
  const token = jwt.sign(
    { sub: claims.userId, sid: claims.sessionId, role: claims.standing, iat: issued, exp: expires },
    config.tokens.secret,
    { algorithm: 'HS256', issuer },
  );
  return { token, expiresAt: new Date(expires * 1000) };
};

/** Reads an access token; a wrong signature, another algorithm or other claims are all `invalid`. */
export const readAccessToken = (
  config: Config,
  token: string,
): { ok: true; claims: Claims } | { ok: false; reason: 'expired' | 'invalid' } => {
  try {
    const read = payload.safeParse(jwt.verify(token, config.tokens.secret, { algorithms: ['HS256'], issuer }));
    if (!read.success) return { ok: false, reason: 'invalid' };
    return { ok: true, claims: { standing: read.data.role, userId: read.data.sub, sessionId: read.data.sid } };
  } catch (error) {
    return { ok: false, reason: error instanceof jwt.TokenExpiredError ? 'expired' : 'invalid' };
  }
};
