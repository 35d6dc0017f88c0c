import type { NextConfig } from 'next'

const nextConfig: NextConfig = {
  distDir: process.env.NEXT_DIST_DIR ?? '.next',
  poweredByHeader: false,
  // A gateway reads plain bodies and follows no redirect (API.md section 1).
  compress: false,
  skipTrailingSlashRedirect: true,
  // PGlite finds its .wasm and .data beside its own files, so it must not be bundled; the others are native or optional-require packages.
  serverExternalPackages: ['@electric-sql/pglite', '@node-rs/argon2', 'pino', 'pg'],
  turbopack: {
    root: import.meta.dirname,
    // Turbopack drops apidom's refractor registration (a side effect behind a re-export); the CommonJS build keeps it.
    resolveAlias: {
      '@swagger-api/apidom-ns-openapi-3-1': './node_modules/@swagger-api/apidom-ns-openapi-3-1/src/index.cjs',
    },
  },
}

export default nextConfig
