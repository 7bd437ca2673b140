/** @type {import("next").NextConfig} */
const config = {
  // The tests build elsewhere, so that they can't pull the ground from under a running product.
  distDir: process.env.NEXT_DIST_DIR || ".next",
  typescript: { ignoreBuildErrors: true }, // `npm test` checks the types; the build need not do it again
  poweredByHeader: false,
  // Both choose a database driver at run time, which a bundler can't follow.
  serverExternalPackages: ["knex", "pg-boss"],
};

export default config;
