import type { NextConfig } from 'next';

const config: NextConfig = {
  poweredByHeader: false,
  reactStrictMode: true,
  typedRoutes: false,
  distDir: process.env.NEXT_DIST_DIR ?? '.next',
  serverExternalPackages: [
    'pg-boss',
    'pg',
    'postgres',
    'pino',
    'sharp',
    'nodemailer',
    '@react-pdf/renderer',
    'highs',
  ],
  experimental: { serverActions: { allowedOrigins: [] } },
  async headers() {
    return [
      {
        source: '/:path*',
        headers: [
          { key: 'X-Content-Type-Options', value: 'nosniff' },
          { key: 'Referrer-Policy', value: 'same-origin' },
          { key: 'X-Frame-Options', value: 'DENY' },
          { key: 'Permissions-Policy', value: 'camera=(self), microphone=(), geolocation=()' },
        ],
      },
    ];
  },
};

export default config;
