/** What the server is told from outside, read once and checked. */
export interface Settings {
  /** Signs cookies; `npm start` makes one and keeps it in the data folder. */
  readonly secret: string;
  /** Address that people type, where a proxy stands before the server: `https://…` also makes cookies secure. */
  readonly publicUrl: string | undefined;
  /** Port on 127.0.0.1, or on `AMPERSIGN_HOST`. */
  readonly port: number;
  readonly host: string;
  readonly development: boolean;
}

const SHORTEST_SECRET = 32;

/** Reads the environment. @throws with the name of the setting that is missing or wrong */
export function settings(
  environment: Readonly<Record<string, string | undefined>> = process.env,
): Settings {
  const secret = environment["AMPERSIGN_SECRET"] ?? "";
  if (secret.length < SHORTEST_SECRET) {
    throw new Error(`AMPERSIGN_SECRET must have at least ${SHORTEST_SECRET} characters.`);
  }
  return {
    secret,
    publicUrl: readUrl(environment["AMPERSIGN_URL"]),
    port: readPort(environment["PORT"]),
    host: environment["AMPERSIGN_HOST"] ?? "127.0.0.1",
    development: environment["NODE_ENV"] === "development",
  };
}

/** A port of the environment; 3000 where none is given, 0 for any that is free. @throws when it is not a port */
function readPort(given: string | undefined): number {
  if (given === undefined || given === "") return 3000;
  const port = Number(given);
  if (Number.isInteger(port) && port >= 0 && port < 65_536) return port;
  throw new Error(`PORT must be a whole number from 0 to 65535, not ${given}.`);
}

function readUrl(given: string | undefined): string | undefined {
  if (given === undefined || given === "") return undefined;
  if (URL.canParse(given) && /^https?:$/.test(new URL(given).protocol))
    return new URL(given).origin;
  throw new Error(
    `AMPERSIGN_URL must be an address such as https://review.example.org, not ${given}.`,
  );
}
