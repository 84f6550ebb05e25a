import { inject } from 'vitest';

/** Settings as the environment would give them, for a server on the given database and this run's stand-ins. */
export function testSettings(databaseUrl: string, changes: Record<string, string | undefined> = {}): Record<string, string | undefined> {
  return {
    NODE_ENV: 'test',
    KARYA_DEMO: 'on',
    DATABASE_URL: databaseUrl,
    AUTH_SECRET: 'a-secret-for-tests-only-0123456789abcdef',
    MAIL_API_URL: inject('mailApiUrl'),
    MAIL_API_KEY: inject('mailApiKey'),
    MAIL_FROM: 'Register <register@demo.example>',
    STORAGE_ENDPOINT: inject('storageEndpoint'),
    STORAGE_BUCKET: 'attachments',
    STORAGE_ACCESS_KEY_ID: inject('storageAccessKeyId'),
    STORAGE_SECRET_ACCESS_KEY: inject('storageSecretAccessKey'),
    LOG_LEVEL: 'silent',
    SIGN_IN_CALLS_PER_MINUTE: '100000',
    CALCULATOR_CALLS_PER_MINUTE: '100000',
    ...changes,
  };
}
