import { pino } from "pino";

/** One line of JSON each. Cookies, passwords and tokens are never given to it. */
export const log = pino({ level: process.env["LOG_LEVEL"] ?? "warn", base: null });
