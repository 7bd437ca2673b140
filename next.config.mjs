/** @type {import("next").NextConfig} */
const config = {
  // The tests build elsewhere, so that they can't pull the ground from under a running product.
  distDir: process.env.NEXT_DIST_DIR || ".next",
  typescript: { ignoreBuildErrors: true }, // `npm test` checks the types; the build need not do it again
  poweredByHeader: false,
  reactStrictMode: true,
  // Native or self-loading packages that a bundler must leave alone.
  serverExternalPackages: ["@node-rs/argon2", "knex", "pg", "pg-boss", "pino"],
  async headers() {
    return [
      {
        source: "/:path*",
        headers: [
          { key: "x-content-type-options", value: "nosniff" },
          { key: "referrer-policy", value: "same-origin" },
          { key: "cross-origin-opener-policy", value: "same-origin" },
          { key: "permissions-policy", value: "camera=(self), microphone=(self), geolocation=(), payment=(), usb=()" },
        ],
      },
    ];
  },
};

export default config;
