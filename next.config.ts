import type { NextConfig } from "next";

const config: NextConfig = {
  poweredByHeader: false,
  reactStrictMode: true,
  // Native modules and drivers stay outside the bundle.
  serverExternalPackages: ["mysql2", "@node-rs/argon2", "pino"],
};

export default config;
