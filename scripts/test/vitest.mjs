import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';

import { runToEnd } from '../start/processes.mjs';
import { tallyVitest } from './tally.mjs';

/**
 * Runs one Vitest project, readable on the screen and counted from its JSON report.
 * @param {{ root: string, folder: string, project: string, filters: string[], environment: NodeJS.ProcessEnv }} run folder: where the report is written
 * @returns {Promise<import('./tally.mjs').Tally>}
 */
export async function runVitest({ root, folder, project, filters, environment }) {
  const reportFile = path.join(folder, `${project}-report.json`);
  const end = await runToEnd({
    command: process.execPath,
    parameters: [
      path.join(root, 'node_modules', 'vitest', 'vitest.mjs'),
      'run',
      `--project=${project}`,
      // A forgotten `.only` would silently leave out all the others.
      '--allowOnly=false',
      '--passWithNoTests=false',
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${reportFile}`,
      ...filters,
    ],
    cwd: root,
    env: { ...environment, NODE_ENV: 'test' },
  });
  const report = existsSync(reportFile) ? JSON.parse(readFileSync(reportFile, 'utf8')) : null;
  const filteredByName = filters.some((filter) => /^(-t|--testNamePattern)\b/.test(filter));
  return tallyVitest(project, report, end, { filteredByName });
}
