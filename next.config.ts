import type { NextConfig } from "next";

const config: NextConfig = {
  typedRoutes: true,
  reactStrictMode: true,
  poweredByHeader: false,
  agentRules: false,
  serverExternalPackages: ["@resvg/resvg-js", "pg-boss"],
  experimental: { serverActions: { bodySizeLimit: "2mb" }, proxyClientMaxBodySize: "17mb" },
  allowedDevOrigins: ["127.0.0.1"],
};

export default config;
