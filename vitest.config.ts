import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));

/**
 * Three projects: `unit` (pure code, no services), `server` (real PostgreSQL, one clone of a
 * migrated template per file) and `client` (components under happy-dom).
 */
export default defineConfig({
  test: {
    projects: [
      {
        test: {
          name: 'unit',
          environment: 'node',
          include: ['tests/shared/**/*.test.ts', 'tests/data/**/*.test.ts', 'tests/charts/**/*.test.ts'],
        },
      },
      {
        test: {
          name: 'server',
          environment: 'node',
          include: ['tests/server/**/*.test.ts', 'tests/db/**/*.test.ts'],
          globalSetup: ['tests/support/globalSetup.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
          maxWorkers: 2,
        },
      },
      {
        define: { __DEV__: 'true', 'process.env.EXPO_OS': '"web"' },
        resolve: {
          extensions: ['.web.tsx', '.web.ts', '.web.mjs', '.web.js', '.tsx', '.ts', '.mjs', '.js', '.json'],
          alias: [
            { find: /^react-native$/, replacement: here('node_modules/react-native-web/dist/index.js') },
            { find: /^react-native-svg$/, replacement: here('node_modules/react-native-svg/lib/module/index.js') },
            // The real router needs Metro; where pages lead is covered in the browser.
            { find: /^expo-router\/head$/, replacement: here('tests/components/support/expoRouterHead.tsx') },
            { find: /^expo-router$/, replacement: here('tests/components/support/expoRouter.tsx') },
          ],
        },
        test: {
          name: 'client',
          environment: 'happy-dom',
          include: ['tests/components/**/*.test.{ts,tsx}'],
          setupFiles: ['tests/components/support/clientSetup.ts'],
          testTimeout: 20_000,
          maxWorkers: 2,
          server: { deps: { inline: [/react-native/, /expo/, /victory/, /d3-/] } },
        },
      },
    ],
  },
});
