import type { NextConfig } from "next";

const config: NextConfig = {
  // Sequelize requires every dialect it knows; bundling it fails on the drivers that are not installed.
  serverExternalPackages: ["sequelize"],
  typedRoutes: true,
  poweredByHeader: false,
  experimental: {
    // forbidden() answers 403 with app/forbidden.tsx.
    authInterrupts: true,
    serverActions: { bodySizeLimit: "512kb" },
    proxyClientMaxBodySize: "1mb",
  },
};

export default config;
