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
  typedRoutes: false,
  devIndicators: false,
  poweredByHeader: false,
};

export default withNextIntl(config);
