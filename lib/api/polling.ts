/** Milliseconds until the next look: a number, or told by the latest answer. 0 looks no more. */
type RefreshInterval<Result> = number | ((latest: Result | undefined) => number) | undefined;

/**
 * SWR asks for the interval before the first answer, and again only after an answer that differs from what is shown. When the server drew
 * the page with the very state that the first answer repeats, neither says that something moves, and nobody would ever look again. So until
 * there is an answer, what the server knew decides.
 */
export function startFromFallback<Result>(refreshInterval: RefreshInterval<Result>, fallback: Result | undefined): RefreshInterval<Result> {
  return typeof refreshInterval === 'function' ? (latest) => refreshInterval(latest ?? fallback) : refreshInterval;
}
