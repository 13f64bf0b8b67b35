import { join } from 'node:path';
import { ESLint } from 'eslint';
import { beforeAll, describe, expect, it } from 'vitest';
import { ROOT } from '../../support/server';

let eslint: ESLint;
beforeAll(() => (eslint = new ESLint({ cwd: ROOT })));

/** The rules that a text would break, were it the file of that name. */
async function broken(file: string, text: string): Promise<string[]> {
  const [result] = await eslint.lintText(text, { filePath: join(ROOT, file), warnIgnored: true });
  return (result?.messages ?? []).map(({ ruleId, message }) => ruleId ?? message);
}

const lines = (count: number) => Array.from({ length: count }, (_, i) => `export const line${i} = ${i};`).join('\n');

describe('lint keeps each room to its own', () => {
  it.each([
    ['shared/measure/x.ts', "import { ref } from 'vue';\nexport const x = ref(0);", 'no-restricted-imports'],
    ['shared/measure/x.ts', "import { Vector3 } from 'three';\nexport const x = new Vector3();", 'no-restricted-imports'],
    ['shared/measure/x.ts', "import { createError } from 'h3';\nexport const x = createError;", 'no-restricted-imports'],
    ['shared/measure/x.ts', "import { sql } from 'drizzle-orm';\nexport const x = sql;", 'no-restricted-imports'],
    ['shared/measure/x.ts', "import { readFileSync } from 'node:fs';\nexport const x = readFileSync;", 'no-restricted-imports'],
    ['shared/measure/x.ts', "import { readFileSync } from 'fs';\nexport const x = readFileSync;", 'no-restricted-imports'],
    ['shared/measure/x.ts', "import { x as y } from '../../server/utils/x';\nexport const x = y;", 'no-restricted-imports'],
    ['shared/measure/x.ts', 'export const x = Math.random();', 'no-restricted-properties'],
    ['shared/measure/x.ts', 'export const x = Date.now();', 'no-restricted-globals'],
    ['shared/measure/x.ts', 'export const x = new Date();', 'no-restricted-globals'],
    ['shared/measure/x.ts', 'export const x = process.env.X;', 'no-restricted-globals'],
    ['shared/measure/x.ts', 'export const x = window.name;', 'no-restricted-globals'],
    ['shared/measure/x.ts', 'console.log(1);', 'no-console'],
    ['shared/measure/x.ts', "throw new Error('x');", 'no-restricted-syntax'],
    ['shared/measure/x.ts', 'export default 1;', 'no-restricted-syntax'],
    ['shared/measure/x.ts', 'export const x: any = 1;', '@typescript-eslint/no-explicit-any'],
    ['shared/measure/x.ts', 'export const x = (y: string | null) => y!.length;', '@typescript-eslint/no-non-null-assertion'],
    ['shared/measure/x.ts', lines(251), 'max-lines'],
    ['shared/reader/x.ts', "import { planSlot } from '../slot/plan';\nexport const x = planSlot;", 'no-restricted-imports'],
    ['shared/reader/x.ts', "import { GRID } from '../program/grid';\nexport const x = GRID;", 'no-restricted-imports'],
    ['shared/readback/rules/x.ts', "import { lap } from '#shared/slot/lap';\nexport const x = lap;", 'no-restricted-imports'],
    ['shared/readback/rules/x.ts', "import { writeProgram } from '../../program/write';\nexport const x = writeProgram;", 'no-restricted-imports'],
    ['shared/readback/x.ts', "import { writeProgram } from '#shared/program/write';\nexport const x = writeProgram;", 'no-restricted-imports'],
    ['server/services/x.ts', lines(251), 'max-lines'],
    ['server/services/x.ts', "import SQLite from 'better-sqlite3';\nexport const x = SQLite;", 'no-restricted-imports'],
    ['server/api/x.get.ts', lines(21), 'max-lines'],
    ['app/pages/x.vue', `<script setup lang="ts">\n${lines(201).replaceAll('export ', '')}\n</script>\n<template><p /></template>`, 'max-lines'],
  ])('%s may not: %s', async (file, text, rule) => {
    expect(await broken(file, text)).toContain(rule);
  });

  it.each([
    ['shared/assert.ts', "export function x() {\n  throw new Error('x');\n}"],
    ['shared/measure/x.ts', lines(250)],
    ['shared/reader/x.ts', "import { UNITS } from '../measure/units';\nexport const x = UNITS;"],
    ['shared/readback/x.ts', "import type { SlotSpec } from '../slot/spec';\nexport const x = (spec: SlotSpec) => spec.length;"],
    ['shared/slot/x.ts', "import { GRID } from '../program/grid';\nexport const x = GRID;"],
    ['shared/slot/x.ts', "import { z } from 'zod';\nexport const x = z.string();"],
    ['server/db/client.ts', "import SQLite from 'better-sqlite3';\nexport const x = SQLite;"],
    ['server/api/x.get.ts', lines(20)],
  ])('%s may: %s', async (file, text) => {
    expect(await broken(file, text)).toEqual([]);
  });
});
