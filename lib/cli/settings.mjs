/**
 * The environment of the servers of one installation: what README.md's table names, filled in for servers of our own.
 * @param {{ ports: Record<string, number>, secrets: import("./secrets.mjs").Secrets, cluster: import("./cluster.mjs").Cluster, database: string }} parts
 * @returns {Record<string, string>}
 */
export function settingsFor({ ports, secrets, cluster, database }) {
  const local = (port) => `http://127.0.0.1:${port}`;
  return {
    ...process.env,
    DATABASE_URL: cluster.appUrl(database),
    MIGRATION_DATABASE_URL: cluster.ownerUrl(database),
    APP_URL: local(ports.app),
    NEXTAUTH_URL: local(ports.app),
    NEXTAUTH_SECRET: secrets.sessionSecret,
    S3_ENDPOINT: local(ports.store),
    S3_PUBLIC_ENDPOINT: local(ports.store),
    S3_REGION: "us-east-1",
    S3_BUCKET: "witnessline",
    S3_ACCESS_KEY_ID: secrets.storeKeyId,
    S3_SECRET_ACCESS_KEY: secrets.storeSecret,
    S3_FORCE_PATH_STYLE: "1",
    SMTP_URL: `smtp://127.0.0.1:${ports.mail}`,
    MAIL_FROM: "Witnessline <no-reply@demo.invalid>",
    MAIL_SINK_URL: local(ports.mailPage),
    DEMO: "1",
    NEXT_TELEMETRY_DISABLED: "1",
  };
}
