import { z } from 'zod';

/**
 * All settings, read once from the environment. A setting with an empty value counts as not set.
 * `settings` below is the whole list; README's table is checked against it.
 */

const loopbackHosts = new Set(['127.0.0.1', 'localhost', '::1', '[::1]']);

interface Setting {
  name: string;
  /** What is used when it is not set, in words for the reader. */
  default: string;
  meaning: string;
}

export const settingsTable: readonly Setting[] = [
  { name: 'PORT', default: '4680', meaning: 'the port of client and API' },
  { name: 'HOST', default: '127.0.0.1', meaning: 'the address the server listens on; demo mode stays on loopback' },
  { name: 'APP_URL', default: 'http://127.0.0.1:PORT', meaning: 'the address people open; it stands in mails and citations' },
  { name: 'DATABASE_URL', default: "the project's own cluster", meaning: 'the address of a PostgreSQL database, when another is to be used' },
  { name: 'KARYA_DEMO', default: 'on', meaning: 'on: demonstration accounts and data, only on loopback; off: an empty register with the vocabularies. Chosen at the first start' },
  { name: 'DEMO_PASSWORD', default: 'karya-demo-2026', meaning: 'the password of the demonstration accounts' },
  { name: 'AUTH_SECRET', default: 'made at the first start in demo mode', meaning: 'at least 32 characters that sign the sessions; required outside demo mode' },
  { name: 'MAIL_API_URL', default: 'https://api.resend.com', meaning: 'the address of the mail API; in demo mode the local stand-in' },
  { name: 'MAIL_API_KEY', default: 'none', meaning: 'the key of the mail API; required outside demo mode' },
  { name: 'MAIL_FROM', default: 'none', meaning: 'the sender of every mail; required outside demo mode' },
  { name: 'STORAGE_ENDPOINT', default: 'the address AWS gives the region', meaning: 'the address of the object storage; in demo mode the local stand-in' },
  { name: 'STORAGE_REGION', default: 'us-east-1', meaning: 'the region of the object storage' },
  { name: 'STORAGE_BUCKET', default: 'none', meaning: 'the bucket for attachments; required outside demo mode' },
  { name: 'STORAGE_ACCESS_KEY_ID', default: 'none', meaning: 'the key id of the object storage; required outside demo mode' },
  { name: 'STORAGE_SECRET_ACCESS_KEY', default: 'none', meaning: 'the secret of the object storage; required outside demo mode' },
  { name: 'LOG_LEVEL', default: 'info', meaning: 'fatal, error, warn, info, debug, trace or silent' },
  { name: 'FREEZE_AGREEMENT', default: 'one', meaning: 'one: a curator freezes a version alone; two: a second curator or the administrator agrees first' },
  { name: 'CALCULATOR_CALLS_PER_MINUTE', default: '600', meaning: 'how often one address may call the calculators (at least 300)' },
  { name: 'SIGN_IN_CALLS_PER_MINUTE', default: '60', meaning: 'how often one address may try to sign in (at least 30)' },
  { name: 'WEB_DIST', default: 'dist', meaning: 'the folder of the exported web client' },
  { name: 'KARYA_FIRST_ACCOUNT_FILE', default: 'none', meaning: 'the file that receives the one-time link of the first account outside demo mode; npm start sets it' },
  { name: 'KARYA_KILL_AT', default: 'none', meaning: 'only with NODE_ENV=test: the named point at which the process kills itself' },
  { name: 'KARYA_KILL_LOG', default: 'none', meaning: 'only with NODE_ENV=test: the file that receives the name of the point once it is reached' },
];

const wholeNumber = (lowest: number, highest: number, fallback: number) =>
  z
    .string()
    .refine((text) => /^\d+$/.test(text) && Number(text) >= lowest && Number(text) <= highest, {
      error: highest === Number.MAX_SAFE_INTEGER ? `a whole number of at least ${lowest}` : `a whole number from ${lowest} to ${highest}`,
    })
    .transform(Number)
    .default(fallback);

const webAddress = z.string().refine((text) => /^https?:\/\/[^\s/]+/.test(text) && URL.canParse(text), { error: 'an address that begins with http:// or https://' }).transform((text) => text.replace(/\/+$/, ''));
const given = (expected: string) => z.string({ error: expected });

const environmentSchema = z.object({
  NODE_ENV: z.enum(['production', 'development', 'test'], { error: 'production, development or test' }).default('production'),
  PORT: wholeNumber(1, 65_535, 4680),
  HOST: z.string().default('127.0.0.1'),
  APP_URL: webAddress.optional(),
  DATABASE_URL: given('the address of a PostgreSQL database (npm start sets it)').refine((text) => /^postgres(ql)?:\/\//.test(text) && URL.canParse(text), { error: 'an address that begins with postgresql://' }),
  KARYA_DEMO: z.enum(['on', 'off'], { error: 'on or off' }).default('on'),
  DEMO_PASSWORD: z.string().min(10, { error: 'at least 10 characters' }).default('karya-demo-2026'),
  AUTH_SECRET: given('at least 32 characters that nobody else knows').min(32, { error: 'at least 32 characters' }),
  MAIL_API_URL: webAddress.default('https://api.resend.com'),
  MAIL_API_KEY: given('the key of the mail API'),
  MAIL_FROM: given('the sender of the mails, such as "Register <register@your.domain>"').refine((text) => text.includes('@'), { error: 'a mail address' }),
  STORAGE_ENDPOINT: webAddress.optional(),
  STORAGE_REGION: z.string().default('us-east-1'),
  STORAGE_BUCKET: given('the name of the bucket for attachments'),
  STORAGE_ACCESS_KEY_ID: given('the key id of the object storage'),
  STORAGE_SECRET_ACCESS_KEY: given('the secret of the object storage'),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent'], { error: 'fatal, error, warn, info, debug, trace or silent' }).default('info'),
  FREEZE_AGREEMENT: z.enum(['one', 'two'], { error: 'one or two' }).default('one'),
  CALCULATOR_CALLS_PER_MINUTE: wholeNumber(300, Number.MAX_SAFE_INTEGER, 600),
  SIGN_IN_CALLS_PER_MINUTE: wholeNumber(30, Number.MAX_SAFE_INTEGER, 60),
  WEB_DIST: z.string().default('dist'),
  KARYA_FIRST_ACCOUNT_FILE: z.string().optional(),
  KARYA_KILL_AT: z.string().optional(),
  KARYA_KILL_LOG: z.string().optional(),
});

type Settings = z.infer<typeof environmentSchema>;

export interface Config {
  environment: 'production' | 'development' | 'test';
  host: string;
  port: number;
  /** Without a slash at its end. */
  appUrl: string;
  databaseUrl: string;
  demo: boolean;
  demoPassword: string;
  authSecret: string;
  mail: { apiUrl: string; apiKey: string; from: string };
  storage: { endpoint: string | undefined; region: string; bucket: string; accessKeyId: string; secretAccessKey: string };
  logLevel: Settings['LOG_LEVEL'];
  freezeAgreement: 'one' | 'two';
  limits: { calculatorPerMinute: number; signInPerMinute: number };
  webDist: string;
  firstAccountFile: string | undefined;
  /** The named point at which a test lets the process die; undefined outside tests. */
  killAt: string | undefined;
  /** Where the name of that point is noted once it is reached. */
  killLog: string | undefined;
}

/** A setting is wrong: the message is one sentence per problem, for the person who starts the server. */
export class ConfigError extends Error {
  readonly problems: readonly string[];
  constructor(problems: readonly string[]) {
    super(problems.join(' '));
    this.name = 'ConfigError';
    this.problems = problems;
  }
}

const secretNames = /PASSWORD|SECRET|KEY/;

function shown(name: string, value = ''): string {
  if (secretNames.test(name)) return `has ${value.length} characters`;
  return `is "${name === 'DATABASE_URL' ? value.replace(/:[^:@/]*@/, ':…@') : value}"`;
}

function isLoopback(settings: Settings): string | undefined {
  if (!loopbackHosts.has(settings.HOST)) return `HOST is "${settings.HOST}", but demo mode runs on loopback only: leave HOST out or set KARYA_DEMO=off.`;
  if (settings.APP_URL !== undefined && !loopbackHosts.has(new URL(settings.APP_URL).hostname))
    return `APP_URL is "${settings.APP_URL}", but demo mode runs on loopback only: leave APP_URL out or set KARYA_DEMO=off.`;
  return undefined;
}

/** Reads all settings; throws ConfigError naming each wrong setting, the value found and what was expected. */
export function loadConfig(environment: Record<string, string | undefined>): Config {
  const present = Object.fromEntries(Object.entries(environment).filter(([, value]) => value !== undefined && value.trim() !== ''));
  const parsed = environmentSchema.safeParse(present);
  if (!parsed.success) {
    const names = parsed.error.issues.map((issue) => String(issue.path[0]));
    const missing = names.filter((name) => present[name] === undefined);
    // Outside demo mode a first try lacks them all: one sentence reads better than seven.
    const together = present['KARYA_DEMO'] === 'off' && missing.length > 1;
    const sentences = parsed.error.issues.flatMap((issue, index) => {
      const name = names[index] ?? '';
      if (present[name] !== undefined) return [`${name} ${shown(name, present[name])}; expected is ${issue.message}.`];
      return together ? [] : [`${name} is not set; expected is ${issue.message}${present['KARYA_DEMO'] === 'off' ? ' (required outside demo mode)' : ''}.`];
    });
    if (together) sentences.push(`Outside demo mode ${missing.join(', ')} are required and not set; README says what each is.`);
    throw new ConfigError(sentences);
  }
  const settings = parsed.data;
  const demo = settings.KARYA_DEMO === 'on';
  const problems: string[] = [];
  const notLoopback = demo ? isLoopback(settings) : undefined;
  if (notLoopback !== undefined) problems.push(notLoopback);
  for (const name of ['KARYA_KILL_AT', 'KARYA_KILL_LOG'] as const) {
    if (settings[name] !== undefined && settings.NODE_ENV !== 'test') problems.push(`${name} is "${settings[name]}"; expected is none, because it is for tests only.`);
  }
  if (problems.length > 0) throw new ConfigError(problems);
  return {
    environment: settings.NODE_ENV,
    host: settings.HOST,
    port: settings.PORT,
    appUrl: settings.APP_URL ?? `http://127.0.0.1:${settings.PORT}`,
    databaseUrl: settings.DATABASE_URL,
    demo,
    demoPassword: settings.DEMO_PASSWORD,
    authSecret: settings.AUTH_SECRET,
    mail: { apiUrl: settings.MAIL_API_URL, apiKey: settings.MAIL_API_KEY, from: settings.MAIL_FROM },
    storage: {
      endpoint: settings.STORAGE_ENDPOINT,
      region: settings.STORAGE_REGION,
      bucket: settings.STORAGE_BUCKET,
      accessKeyId: settings.STORAGE_ACCESS_KEY_ID,
      secretAccessKey: settings.STORAGE_SECRET_ACCESS_KEY,
    },
    logLevel: settings.LOG_LEVEL,
    freezeAgreement: settings.FREEZE_AGREEMENT,
    limits: { calculatorPerMinute: settings.CALCULATOR_CALLS_PER_MINUTE, signInPerMinute: settings.SIGN_IN_CALLS_PER_MINUTE },
    webDist: settings.WEB_DIST,
    firstAccountFile: settings.KARYA_FIRST_ACCOUNT_FILE,
    killAt: settings.KARYA_KILL_AT,
    killLog: settings.KARYA_KILL_LOG,
  };
}
