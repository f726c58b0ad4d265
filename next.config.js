/** @type {import('next').NextConfig} */
export default {
  reactStrictMode: true,
  poweredByHeader: false,
  // The process serves on loopback by default; development reload needs these origins named.
  allowedDevOrigins: ['127.0.0.1', 'localhost'],
  // Pages are handed to Next whole, so Next packs them; the API packs its own answers.
  compress: true,
  // `npm run types` checks the whole project; a build need not do it again.
  typescript: { ignoreBuildErrors: true },
};
