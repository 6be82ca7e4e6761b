/** @type {import("next").NextConfig} */
export default {
  // A file that runs in the browser says so in its name, the error page too.
  pageExtensions: ["client.tsx", "tsx", "ts"],
  poweredByHeader: false,
  reactStrictMode: true,
  devIndicators: false,
  allowedDevOrigins: ["127.0.0.1", "localhost"],
  // Two copies of Yjs in one process do not know each other's types; the rest resolve files of their own.
  serverExternalPackages: [
    "yjs",
    "y-websocket",
    "y-protocols",
    "lib0",
    "pg",
    "@prisma/client",
    "@prisma/adapter-pg",
    "better-auth",
    "pg-boss",
    "piscina",
    "pdfmake",
    "wawoff2",
    "pino",
  ],
  turbopack: { root: import.meta.dirname },
  // `npm run types` checks them, tests included; a build at the first start should not wait for that.
  typescript: { ignoreBuildErrors: true },
};
