import "server-only";
import pino from "pino";
import { env } from "./env";

/** The server's log: JSON lines, one a line whatever the text holds, with secrets removed. */
export const log = pino({
  level: env().LOG_LEVEL,
  redact: { paths: ["password", "*.password", "authorization", "*.authorization", "cookie", "*.cookie", "key", "token"], remove: true },
  base: null,
});
