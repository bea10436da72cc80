/** Distances from zero at which an arm of the margin scale has its stops, dB. Tokens are named after them. */
export const MARGIN_STOPS_DB: readonly number[] = [0, 1, 3, 6];

/**
 * Colour of a margin as CSS, mixed between the stops of its arm so that it follows the theme. Zero belongs to the arm
 * in hand; a margin that is no finite number counts as the worst there is.
 */
export function marginColour(marginDb: number): string {
  const worst = MARGIN_STOPS_DB[MARGIN_STOPS_DB.length - 1];
  const inHand = marginDb >= 0;
  const arm = inHand ? 'hand' : 'short';
  const distanceDb = Number.isNaN(marginDb) ? worst : Math.min(Math.abs(marginDb), worst);
  const to = Math.max(
    1,
    MARGIN_STOPS_DB.findIndex((stop) => distanceDb <= stop),
  );
  const share = (distanceDb - MARGIN_STOPS_DB[to - 1]) / (MARGIN_STOPS_DB[to] - MARGIN_STOPS_DB[to - 1]);
  const token = (stop: number) => `var(--${arm}-${MARGIN_STOPS_DB[stop]})`;
  return `color-mix(in oklab, ${token(to - 1)}, ${token(to)} ${Math.round(100 * share)}%)`;
}
