import { z } from 'zod';

const loopbackHosts = ['127.0.0.1', '::1', 'localhost'];

const flag = z
  .enum(['0', '1', ''])
  .optional()
  .transform((value) => value === '1');

const environmentSchema = z
  .object({
    DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/, error: 'DATABASE_URL must be a postgres:// address.' }),
    /** Signs in as the owner of the tables, for migrations and grants. Absent: DATABASE_URL does both. */
    DATABASE_OWNER_URL: z
      .url({ protocol: /^postgres(ql)?$/, error: 'DATABASE_OWNER_URL must be a postgres:// address.' })
      .optional(),
    HOST: z.string().default('127.0.0.1'),
    PORT: z.coerce.number({ error: 'PORT must be a number.' }).int().min(1).max(65_535).default(3000),
    /** The address that people type. Absent: http on the host and port. */
    PUBLIC_URL: z.url({ protocol: /^https?$/, error: 'PUBLIC_URL must be an http or https address.' }).optional(),
    /** Certificate and key of our own, as PEM files: the server then speaks https itself. */
    TLS_CERTIFICATE_FILE: z.string().optional(),
    TLS_KEY_FILE: z.string().optional(),
    /** A proxy in front of us ends https and overwrites the forwarding headers. */
    TRUSTED_PROXY: flag,
    NEXTAUTH_SECRET: z.string().min(32, { error: 'NEXTAUTH_SECRET needs at least 32 characters.' }),
    /** How much faster than real time simulated stations run. Real stations always run at 1. */
    SILLWRIGHT_CLOCK_RATE: z.coerce.number().min(1).max(1000).default(1),
    /** The local demo: seeded when empty, its accounts printed at start. */
    SILLWRIGHT_DEMO: flag,
    SILLWRIGHT_DATA: z.string().default('.sillwright'),
    /** Photographs, drawings and certificates. Without a bucket nothing can be uploaded or certified; the demo brings its own storage. */
    S3_BUCKET: z.string().optional(),
    S3_REGION: z.string().default('us-east-1'),
    /** Absent: Amazon's. */
    S3_ENDPOINT: z.url({ protocol: /^https?$/, error: 'S3_ENDPOINT must be an http or https address.' }).optional(),
    S3_ACCESS_KEY_ID: z.string().optional(),
    S3_SECRET_ACCESS_KEY: z.string().optional(),
  })
  .refine((e) => !e.S3_BUCKET || (e.S3_ACCESS_KEY_ID && e.S3_SECRET_ACCESS_KEY), {
    error: 'S3_BUCKET needs S3_ACCESS_KEY_ID and S3_SECRET_ACCESS_KEY.',
  })
  .transform((e) => ({
    databaseUrl: e.DATABASE_URL,
    databaseOwnerUrl: e.DATABASE_OWNER_URL ?? e.DATABASE_URL,
    host: e.HOST,
    loopback: loopbackHosts.includes(e.HOST),
    port: e.PORT,
    publicUrl: (
      e.PUBLIC_URL ??
      `http${e.TLS_CERTIFICATE_FILE ? 's' : ''}://${e.HOST.includes(':') ? `[${e.HOST}]` : e.HOST}:${e.PORT}`
    ).replace(/\/$/, ''),
    tls:
      e.TLS_CERTIFICATE_FILE && e.TLS_KEY_FILE
        ? { certificateFile: e.TLS_CERTIFICATE_FILE, keyFile: e.TLS_KEY_FILE }
        : null,
    trustedProxy: e.TRUSTED_PROXY,
    secret: e.NEXTAUTH_SECRET,
    clockRate: e.SILLWRIGHT_CLOCK_RATE,
    demo: e.SILLWRIGHT_DEMO,
    dataFolder: e.SILLWRIGHT_DATA,
    storage: e.S3_BUCKET
      ? {
          endpoint: e.S3_ENDPOINT,
          region: e.S3_REGION,
          bucket: e.S3_BUCKET,
          accessKeyId: e.S3_ACCESS_KEY_ID ?? '',
          secretAccessKey: e.S3_SECRET_ACCESS_KEY ?? '',
        }
      : null,
  }))
  .superRefine((e, context) => {
    if (e.loopback) return;
    if (!e.publicUrl.startsWith('https://')) {
      context.addIssue({
        code: 'custom',
        message: `HOST=${e.host} reaches beyond this computer: set PUBLIC_URL to the https address that people will use.`,
      });
    }
    if (!e.tls && !e.trustedProxy) {
      context.addIssue({
        code: 'custom',
        message: `HOST=${e.host} reaches beyond this computer: give TLS_CERTIFICATE_FILE and TLS_KEY_FILE, or set TRUSTED_PROXY=1 behind a proxy that ends https.`,
      });
    }
    if (e.demo) {
      context.addIssue({
        code: 'custom',
        message: `HOST=${e.host} reaches beyond this computer: the demo accounts have known passwords. Give a DATABASE_URL of your own.`,
      });
    }
  });
export type Environment = z.infer<typeof environmentSchema>;

/** What the program was started with, or the sentences that say what is wrong. */
export function readEnvironment(
  variables: Record<string, string | undefined>,
): { ok: true; environment: Environment } | { ok: false; sentences: string[] } {
  const given = Object.fromEntries(Object.entries(variables).filter(([, value]) => value !== ''));
  const parsed = environmentSchema.safeParse(given);
  if (parsed.success) return { ok: true, environment: parsed.data };
  return {
    ok: false,
    sentences: parsed.error.issues.map((issue) =>
      issue.path[0] !== undefined && !(issue.path[0] in given) ? `${issue.path.join('.')} is missing.` : issue.message,
    ),
  };
}

let cached: Environment | undefined;

/** The environment of this process. Throws when it is wrong; server/index.ts checks it first and says so. */
export function environment(): Environment {
  if (cached) return cached;
  const read = readEnvironment(process.env);
  if (!read.ok) throw new Error(read.sentences.join(' '));
  return (cached = read.environment);
}
