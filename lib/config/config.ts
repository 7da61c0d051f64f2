import { z } from 'zod';

const number = () => z.coerce.number({ error: 'must be a number' });
const whole = (least: number, most = Number.MAX_SAFE_INTEGER) =>
  number().int('must be a whole number').min(least, `must be at least ${least}`).max(most, `must be at most ${most}`);
const seconds = () => number().positive('must be positive').max(3600, 'must be at most 3600');

/** Everything the server reads from its environment. There is no default for anything secret. */
const given = z.object({
  /** Where the PostgreSQL database is; the launcher sets it when it runs a cluster of its own. */
  DATABASE_URL: z.string().regex(/^postgres(ql)?:\/\//, 'must begin with postgres:// or postgresql://'),
  /** The port the server listens on. */
  PORT: whole(1, 65535).default(3000),
  /** What sessions are signed with; the launcher makes one at random and keeps it. */
  NEXTAUTH_SECRET: z.string().min(32, 'must be at least 32 characters long'),
  /** Where people reach the server; links in mail begin with it. */
  PUBLIC_URL: z
    .string()
    .regex(/^https?:\/\/[^\s/?#@]+$/, 'must be an address such as https://quadrel.example, without a slash at its end')
    .optional(),
  /** The mail service that job workers hand messages to. */
  SMTP_URL: z
    .string()
    .regex(/^smtps?:\/\/\S+$/, 'must begin with smtp:// or smtps://')
    .optional(),
  /** The sender of every message. */
  MAIL_FROM: z
    .string()
    .regex(
      /^([^\p{Cc}<>@]*<[^\s<>@]+@[^\s<>@]+>|[^\s<>@]+@[^\s<>@]+)$/u,
      'must be an address such as Quadrel <quadrel@skerry.example>',
    )
    .default('Quadrel <quadrel@localhost>'),
  /** Computations one address may ask for in a minute; 0 sets no limit. */
  COMPUTE_QUOTA_PER_MINUTE: whole(0).default(3000),
  /** Calls one API token may make in a minute; 0 sets no limit. */
  TOKEN_QUOTA_PER_MINUTE: whole(0).default(3000),
  /** Seconds of CPU one interactive computation may take. */
  COMPUTE_SECONDS_INTERACTIVE: seconds().default(2),
  /** Seconds of CPU one computation of a batch may take. */
  COMPUTE_SECONDS_BATCH: seconds().default(60),
  /** Worker threads for computations; 0 takes one for each processor, at least two. */
  COMPUTE_THREADS: whole(0, 64).default(0),
  /** Largest heap of one worker thread, in MiB. */
  COMPUTE_MEMORY_MIB: whole(64, 16384).default(512),
  /** Connections the server keeps to the database, at most. */
  DATABASE_CONNECTIONS: whole(1, 200).default(10),
  /** Whether X-Forwarded-For names the caller; only behind a proxy of one's own that sets it. */
  TRUST_PROXY: z.enum(['0', '1'], { error: 'must be 0 or 1' }).default('0'),
});

const settings = given.transform((values) => ({
  ...values,
  PUBLIC_URL: values.PUBLIC_URL ?? `http://127.0.0.1:${values.PORT}`,
}));

export type Config = z.infer<typeof settings>;

/** Reads and checks an environment. Throws an Error that names every setting that is wrong and what is wrong with it. */
export function readConfig(environment: Record<string, string | undefined>): Config {
  const set = Object.fromEntries(Object.entries(environment).filter(([, value]) => value !== ''));
  const result = settings.safeParse(set);
  if (result.success) return result.data;
  const lines = result.error.issues.map((issue) => {
    const name = issue.path.join('.');
    return set[name] === undefined ? `${name} is not set` : `${name}: ${issue.message}`;
  });
  throw new Error(`The configuration cannot be used. ${lines.join('; ')}. README.md lists the settings.`);
}

let current: Config | undefined;

/** The configuration of this process, read from its environment at the first call. */
export function config(): Config {
  current ??= readConfig(process.env);
  return current;
}
