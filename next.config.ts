import type { NextConfig } from 'next';
import createNextIntlPlugin from 'next-intl/plugin';

const withNextIntl = createNextIntlPlugin('./lib/messages/request.ts');

const config: NextConfig = {
  serverExternalPackages: [
    'serialport',
    '@serialport/bindings-cpp',
    'pg',
    'pg-boss',
    'pino',
    '@node-rs/argon2',
    'pdfkit',
  ],
  // The test command checks the types of the whole repository; a build for use need not wait for them.
  typescript: { ignoreBuildErrors: true },
  typedRoutes: false,
  devIndicators: false,
  poweredByHeader: false,
};

export default withNextIntl(config);
