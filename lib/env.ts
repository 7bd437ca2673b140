import { z } from "zod";

const flag = z.enum(["0", "1"]).default("0").transform((value) => value === "1");

/** Every environment variable that the product reads, with what it means (README: "Run it for real"). */
const schema = z.object({
  DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/ }),
  APP_URL: z.url({ protocol: /^https?$/ }),
  NEXTAUTH_URL: z.url({ protocol: /^https?$/ }),
  NEXTAUTH_SECRET: z.string().min(32, "give at least 32 random characters"),
  S3_ENDPOINT: z.url({ protocol: /^https?$/ }),
  S3_PUBLIC_ENDPOINT: z.url({ protocol: /^https?$/ }),
  S3_REGION: z.string().default("us-east-1"),
  S3_BUCKET: z.string().min(3),
  S3_ACCESS_KEY_ID: z.string().min(1),
  S3_SECRET_ACCESS_KEY: z.string().min(1),
  S3_FORCE_PATH_STYLE: flag,
  SMTP_URL: z.url({ protocol: /^smtps?$/ }),
  MAIL_FROM: z.string().min(3),
  MAIL_SINK_URL: z.url().optional(),
  DEMO: flag,
  UPLOAD_LIMIT_BYTES: z.coerce.number().int().positive().default(10 * 1024 ** 3),
  RECORDING_LIMIT_MS: z.coerce.number().int().positive().default(3 * 3600 * 1000),
});

export type Env = z.infer<typeof schema>;

let parsed: Env | undefined;

/**
 * The environment, checked once.
 * @throws Error that names every variable that is missing or wrong, one a line.
 */
export function env(): Env {
  if (parsed) return parsed;
  const result = schema.safeParse(process.env);
  if (!result.success) {
    const lines = result.error.issues.map((issue) => `  ${issue.path.join(".")}: ${issue.message}`);
    throw new Error(`The environment is not complete. See the table in README.md.\n${lines.join("\n")}`);
  }
  parsed = result.data;
  return parsed;
}
