import type { TestProject } from 'vitest/node';
import { isBuilt } from '../../server/cli/setup/build.mjs';
import { type RunningServer, startServer } from './server';

/** More than any test file asks for in a minute; the limit itself is tested on a server of its own. */
const MANY = '1000000';

interface Shared {
  users: number;
  server: Promise<RunningServer>;
}

declare global {
  /** The one server of this run: each project of vitest.config.ts loads this file anew and finds it here. */
  var tallyrailTestServer: Shared | undefined;
}

declare module 'vitest' {
  interface ProvidedContext {
    /** Of the built server, without a slash at the end. */
    baseUrl: string;
    /** Its data folder. */
    dataFolder: string;
  }
}

/** Starts the built server for the first project that needs it and stops it after the last. */
export default async function setup(project: TestProject) {
  if (!isBuilt()) throw new Error('The built server is missing or older than its sources. Run: npm run build');
  globalThis.tallyrailTestServer ??= { users: 0, server: startServer({ TALLYRAIL_PROGRAMS_PER_MINUTE: MANY }) };
  const shared = globalThis.tallyrailTestServer;
  shared.users += 1;
  const server = await shared.server;
  project.provide('baseUrl', server.url);
  project.provide('dataFolder', server.folder);
  return async () => {
    shared.users -= 1;
    if (shared.users > 0) return;
    globalThis.tallyrailTestServer = undefined;
    await server.stop();
  };
}
