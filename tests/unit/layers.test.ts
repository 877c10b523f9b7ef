import { ESLint } from 'eslint';
import { beforeAll, describe, expect, it } from 'vitest';

let eslint: ESLint;
beforeAll(() => {
  eslint = new ESLint({ cwd: process.cwd() });
});

async function rulesBroken(filePath: string, code: string): Promise<string[]> {
  const [result] = await eslint.lintText(code, { filePath });
  return result.messages.map((message) => message.ruleId ?? message.message);
}

describe('the layers that lint keeps', () => {
  it.each([
    ['lib/network/made.ts', "import { Work } from '@/models/work';\nexport const work = Work;\n", 'no-restricted-imports'],
    ['lib/linking/made.ts', "import { readFileSync } from 'node:fs';\nexport const read = readFileSync;\n", 'no-restricted-imports'],
    ['lib/bibliography/made.ts', 'export const chance = Math.random();\n', 'no-restricted-properties'],
    ['lib/evaluation/made.ts', 'export const now = Date.now();\n', 'no-restricted-properties'],
    ['components/made.tsx', "import { Work } from '@/models/work';\nexport const work = Work;\n", 'no-restricted-imports'],
    ['app/made.ts', 'export const secret = process.env.HEDDLE_SECRET;\n', 'no-restricted-properties'],
  ])('reports what %s may not do', async (filePath, code, rule) => {
    expect(await rulesBroken(filePath, code)).toContain(rule);
  });

  it('lets pure code import pure code', async () => {
    expect(await rulesBroken('lib/network/made.ts', "import { bases } from '@/lib/network/types';\nexport const all = bases;\n")).toEqual([]);
  });
});
