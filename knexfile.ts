import { connectionSettings } from './db/connection';
import { env } from './lib/env';

export default {
  ...connectionSettings(env().databaseUrl),
  migrations: { directory: './db/migrations', extension: 'ts' },
  seeds: { directory: './db/seeds', extension: 'ts' },
};
