/** @type {import('next').NextConfig} */
const config = {
  // Sequelize resolves its dialect by name at run time, which a bundler cannot follow.
  serverExternalPackages: ['sequelize', 'mariadb', 'sharp', 'pino', 'openchemlib'],
  poweredByHeader: false,
  reactStrictMode: true,
  // One build folder per state folder keeps a test build from disturbing a running app.
  distDir: process.env.HEARTCUT_DIST || '.next',
};
export default config;
