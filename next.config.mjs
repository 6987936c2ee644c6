/** @type {import("next").NextConfig} */
const config = {
  output: "standalone",
  poweredByHeader: false,
  reactStrictMode: true,
  // Without this a redirect of the proxy to another host name is made relative, and 127.0.0.1 would send to itself for ever.
  skipProxyUrlNormalize: true,
  outputFileTracingRoot: import.meta.dirname,
  turbopack: { root: import.meta.dirname },
  serverExternalPackages: ["pg", "pg-boss", "pdfkit", "pino"],
  // Types are checked by the type check that `npm test` counts; a second pass inside the build would only make the start slower.
  typescript: { ignoreBuildErrors: true },
  experimental: { cpus: 2 },
};

export default config;
