import { ConfigError, readConfig } from '@/server/config';

// Before anything slow is done in production: every variable that is missing, at once.
try {
  readConfig(process.env);
} catch (error) {
  if (!(error instanceof ConfigError)) throw error;
  process.stderr.write(`${error.message}\n`);
  process.exitCode = 1;
}
