import type { NextConfig } from "next";

const config: NextConfig = {
  // Sequelize requires every dialect it knows; bundling it fails on the drivers that are not installed.
  serverExternalPackages: ["sequelize"],
  typedRoutes: true,
  poweredByHeader: false,
};

export default config;
