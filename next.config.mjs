/** @type {import('next').NextConfig} */
const nextConfig = {
  // Sequelize and its driver choose dialect files at run time, argon2 is a native addon: none of them survives bundling.
  serverExternalPackages: ['sequelize', 'mariadb', '@node-rs/argon2', 'pino', 'umzug'],
  poweredByHeader: false,
  reactStrictMode: true,
  async headers() {
    return [
      {
        source: '/:path*',
        headers: [
          { key: 'X-Content-Type-Options', value: 'nosniff' },
          { key: 'X-Frame-Options', value: 'DENY' },
          { key: 'Referrer-Policy', value: 'same-origin' },
          { key: 'Cross-Origin-Opener-Policy', value: 'same-origin' },
          { key: 'Permissions-Policy', value: 'camera=(), microphone=(), geolocation=(), browsing-topics=()' },
        ],
      },
    ];
  },
};

export default nextConfig;
