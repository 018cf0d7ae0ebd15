import type { NextConfig } from "next";

/** On every answer, pages, files and API alike. The policy of pages carries a nonce, so proxy.ts sets it. */
const EVERYWHERE = [
  { key: "X-Content-Type-Options", value: "nosniff" },
  // Addresses of pages name outfits and records, and an invitation's is a secret: no other site learns them.
  { key: "Referrer-Policy", value: "same-origin" },
  { key: "Cross-Origin-Opener-Policy", value: "same-origin" },
  { key: "Cross-Origin-Resource-Policy", value: "same-origin" },
  { key: "X-Frame-Options", value: "DENY" },
  { key: "Permissions-Policy", value: "camera=(self), geolocation=(self), microphone=(), payment=(), usb=()" },
];

const config: NextConfig = {
  poweredByHeader: false,
  reactStrictMode: true,
  headers: async () => [
    { source: "/:path*", headers: EVERYWHERE },
    {
      source: "/api/:path*",
      headers: [{ key: "Content-Security-Policy", value: "default-src 'none'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'" }],
    },
  ],
  // Native modules and drivers stay outside the bundle.
  serverExternalPackages: ["mysql2", "@node-rs/argon2", "pino"],
};

export default config;
