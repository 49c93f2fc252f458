import type { NextConfig } from "next";

const config: NextConfig = {
  // Sequelize requires every dialect it knows; bundling it fails on the drivers that are not installed.
  serverExternalPackages: ["sequelize"],
  typedRoutes: true,
  poweredByHeader: false,
  // Types are checked by the tests' own stage, over tests and scripts too; a build need not do it again.
  typescript: { ignoreBuildErrors: true },
  experimental: {
    // forbidden() answers 403 with app/forbidden.tsx.
    authInterrupts: true,
    serverActions: { bodySizeLimit: "512kb" },
    proxyClientMaxBodySize: "1mb",
  },
};

export default config;
