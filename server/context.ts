import type { Logger } from 'pino';
import type { Config } from './config';
import type { Database } from './models';
import type { Role } from '@/shared/roles';

/** Who is asking, as the access token says; `by` tells how it came. */
export type Who =
  | { readonly standing: 'guest' }
  | { readonly standing: Role; readonly userId: string; readonly sessionId: string; readonly by: 'cookie' | 'bearer' };

/** What the process gives to every request: made once, in server/index.ts or by a test. */
export interface Platform {
  readonly config: Config;
  readonly db: Database;
  readonly logger: Logger;
  /** The present moment; a test passes its own. */
  readonly now: () => Date;
}

/** What a service is given: the platform, and who asks. */
export interface Context extends Platform {
  readonly who: Who;
  readonly requestId: string;
  /** Address of the caller, for limits only; it is not stored. */
  readonly ip: string;
}
