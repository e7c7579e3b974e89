// Settings of every test process. `testDatabase()` sets DATABASE_URL; the others stay.
// Port 9 discards: a test that wants mail starts a catcher and stubs SMTP_URL.
Object.assign(process.env, {
  NODE_ENV: "test",
  BELLWARD_TEST: "1",
  SMTP_URL: "smtp://127.0.0.1:9",
  MAIL_FROM: "Bellward <camp@bellward.test>",
  NEXTAUTH_SECRET: "a-secret-for-tests-only-of-32-chars-or-more",
  NEXTAUTH_URL: "http://bellward.test",
  DATABASE_URL: "postgres://nobody@127.0.0.1:9/call-testDatabase-first",
});
