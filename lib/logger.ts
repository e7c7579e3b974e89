import { pino } from "pino";

// Read here and not through env(): code that logs must load in a build, which has no settings.
const level = process.env.LOG_LEVEL || (process.env.NODE_ENV === "test" ? "silent" : "info");

/** The server's log: JSON lines on standard output. Secrets and mail bodies never go in; these paths are a second net. */
export const logger = pino({
  level,
  redact: {
    paths: [
      "password",
      "token",
      "secret",
      "*.password",
      "*.token",
      "*.secret",
      "*.authorization",
      "*.cookie",
    ],
    censor: "(removed)",
  },
});
