import { Stop } from '../start/messages.mjs';

/** The parts of `npm test`, in the order in which they run: what fails soonest comes first. */
export const parts = /** @type {const} */ (['lint', 'typecheck', 'pure', 'integration', 'e2e']);

/** @typedef {(typeof parts)[number]} Part */
/** @typedef {{ parts: Part[], filters: string[] }} TestPlan filters go to Vitest: parts of file names, or its own options */

/**
 * `npm test -- [part] [file filter ...]`; no part means all of them, `unit` is another name for `pure`.
 * @param {string[]} parameters
 * @returns {TestPlan}
 */
export function readTestPlan(parameters) {
  const [first, ...filters] = parameters;
  if (first === undefined) return { parts: [...parts], filters: [] };
  const part = first === 'unit' ? 'pure' : first;
  if (!parts.includes(part)) throw new Stop(`"${first}" is no part of the tests. Parts are ${parts.join(', ')} (unit is the same as pure); after one of them may come file names.`);
  if (filters.length > 0 && (part === 'lint' || part === 'typecheck')) throw new Stop(`${part} always looks at everything; it takes no file names.`);
  return { parts: [part], filters };
}
