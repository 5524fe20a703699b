import vue from '@vitejs/plugin-vue'
import { defineConfig } from 'vitest/config'

const databaseSetup = ['tests/helpers/database-setup.ts']

export default defineConfig(({ command, isSsrBuild }) => ({
  plugins: [vue()],
  // The server answers in every mode; Vite never serves a page of its own.
  appType: 'custom',
  define: {
    // A mismatch names itself in the console of the product too, so the browser tests judge what ships.
    __VUE_PROD_HYDRATION_MISMATCH_DETAILS__: 'true',
  },
  build: isSsrBuild
    ? {
        outDir: 'dist/ssr',
        emptyOutDir: true,
        copyPublicDir: false,
        rollupOptions: { input: 'src/entry-server.ts' },
      }
    : {
        outDir: 'dist/client',
        emptyOutDir: true,
        manifest: true,
        ssrManifest: true,
        // Schemas are made by calls that change nothing: those a browser does not use leave its bundle, and zod with them.
        rollupOptions: { treeshake: { manualPureFunctions: ['z'] } },
      },
  // A built server bundle must be self-contained: Naive UI breaks when only some packages are bundled.
  ssr: command === 'build' ? { noExternal: true } : {},
  test: {
    projects: [
      {
        extends: true,
        test: { name: 'shared', environment: 'node', include: ['tests/shared/**/*.test.ts'] },
      },
      {
        extends: true,
        test: {
          name: 'server',
          environment: 'node',
          include: ['tests/server/**/*.test.ts'],
          globalSetup: databaseSetup,
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'seeds',
          environment: 'node',
          include: ['tests/seeds/**/*.test.ts'],
          globalSetup: databaseSetup,
          testTimeout: 300_000,
          hookTimeout: 300_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'src',
          environment: 'happy-dom',
          include: ['tests/src/**/*.test.ts'],
          testTimeout: 20_000,
        },
      },
    ],
  },
}))
