import node from '@astrojs/node';
import react from '@astrojs/react';
import tailwind from '@astrojs/tailwind';
import auth from 'auth-astro';
import { defineConfig, envField } from 'astro/config';
import nodeWorker from './src/tooling/node-worker.mjs';

// Astro refuses every form from a host that is not listed, and bakes the list at build time.
const publicAddress = process.env.PUBLIC_ADDRESS ? new URL(process.env.PUBLIC_ADDRESS) : null;
const allowedDomains = [{ hostname: 'localhost' }, { hostname: '127.0.0.1' }];
if (publicAddress) allowedDomains.push({ hostname: publicAddress.hostname });

export default defineConfig({
  output: 'server',
  adapter: node({ mode: 'standalone' }),
  integrations: [react(), tailwind({ applyBaseStyles: false }), auth({ configFile: './src/auth.config.ts' })],
  security: { checkOrigin: true, allowedDomains },
  env: {
    schema: {
      SESSION_SECRET: envField.string({ context: 'server', access: 'secret' }),
    },
  },
  devToolbar: { enabled: false },
  // The build names every script of a page by its hash; the middleware makes the policy from them.
  experimental: { csp: true },
  vite: {
    plugins: [nodeWorker()],
    // Small fonts would otherwise become data: addresses, which the policy refuses.
    build: { assetsInlineLimit: 0 },
    ssr: { noExternal: ['zod'] },
  },
});
