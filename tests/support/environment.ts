// What every test runs with. Nothing here is reachable from outside; the database's address is set by `testDatabase`.
Object.assign(process.env, {
  APP_URL: "http://app.test",
  NEXTAUTH_URL: "http://app.test",
  NEXTAUTH_SECRET: "only-for-tests-only-for-tests-only-for-tests",
  DATABASE_URL: "postgres://nobody@127.0.0.1:1/none",
  S3_ENDPOINT: "http://127.0.0.1:1",
  S3_PUBLIC_ENDPOINT: "http://127.0.0.1:1",
  S3_BUCKET: "test-bucket",
  S3_ACCESS_KEY_ID: "test",
  S3_SECRET_ACCESS_KEY: "test",
  S3_FORCE_PATH_STYLE: "1",
  SMTP_URL: "smtp://127.0.0.1:1",
  MAIL_FROM: "Witnessline <no-reply@app.test>",
});
export {};
