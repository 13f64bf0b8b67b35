import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));

/** Tests of the built server: it is started once for them all (tests/support/globalSetup.ts). */
const onBuiltServer = { globalSetup: here('./tests/support/globalSetup.ts') };

export default defineConfig({
  resolve: {
    alias: {
      '#shared': here('./shared'),
      '#server': here('./server'),
      '#migrations': here('./tests/support/migrations.ts'),
    },
  },
  test: {
    maxWorkers: 2,
    allowOnly: false,
    passWithNoTests: false,
    projects: [
      {
        extends: true,
        test: { name: 'unit', include: ['tests/{unit,standards,support}/**/*.test.ts'], testTimeout: 60_000, sequence: { groupOrder: 0 } },
      },
      {
        extends: true,
        test: { ...onBuiltServer, name: 'api', include: ['tests/api/**/*.test.ts'], testTimeout: 30_000, sequence: { groupOrder: 1 } },
      },
      {
        extends: true,
        test: { ...onBuiltServer, name: 'browser', include: ['tests/browser/**/*.test.ts'], testTimeout: 120_000, hookTimeout: 60_000, maxWorkers: 1, sequence: { groupOrder: 2 } },
      },
    ],
  },
});
