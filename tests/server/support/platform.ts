import type { Express } from 'express';
import { pino } from 'pino';
import { buildConfig } from './config';
import { freshDatabase } from './database';
import { buildApp } from '@/server/app';
import type { Platform } from '@/server/context';

interface TestServer {
  readonly app: Express;
  readonly platform: Platform;
  /** Moves the server's clock on. */
  readonly wait: (milliseconds: number) => void;
  readonly close: () => Promise<void>;
}

/** The application on a fresh database with a clock that a test can move; close it in afterAll. */
export const testServer = async (variables: Record<string, string> = {}): Promise<TestServer> => {
  const { db, url, drop } = await freshDatabase();
  let ahead = 0;
  const platform: Platform = {
    config: buildConfig({ DATABASE_URL: url, ...variables }),
    db,
    logger: pino({ level: 'silent' }),
    now: () => new Date(Date.now() + ahead),
  };
  return {
    app: buildApp(platform),
    platform,
    wait: (milliseconds) => {
      ahead += milliseconds;
    },
    close: drop,
  };
};
