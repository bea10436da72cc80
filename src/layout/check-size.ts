import { errorAt, type Problem } from './problem';
import type { Layout } from './schema';

/** Five times the largest venue this program is made for. */
const MOST_SEATS = 100_000;
/** Image sources of all talkers and loudspeakers of one scheme: about a gigabyte, and minutes. */
const MOST_IMAGES = 10_000_000;

/** Layouts so large that predicting them would stop the machine; told before anything is made from them. */
export function checkSize(layout: Layout): Problem[] {
  const { venue } = layout;
  const problems: Problem[] = [];
  let seats = 0;
  venue.seating.forEach((part, i) => {
    const before = seats;
    seats += part.kind === 'block' ? part.rows * part.columns : part.seats.length;
    if (before > MOST_SEATS || seats <= MOST_SEATS) return;
    const found = `${seats} seats up to here`;
    problems.push(
      errorAt(`venue.seating[${i}]`, found, `at most ${MOST_SEATS} in all`, 'give it fewer rows or columns'),
    );
  });
  const faces = venue.faces.length;
  const images = Array.from({ length: venue.reflectionOrder }, (_, n) => faces ** (n + 1)).reduce((a, b) => a + b, 1);
  const sources = venue.talkers.length + Math.max(0, ...layout.schemes.map((scheme) => scheme.loudspeakers.length));
  if (images * sources > MOST_IMAGES && venue.reflectionOrder > 0) {
    const found = `order ${venue.reflectionOrder} of ${faces} faces asks for ${images} image sources each of ${sources} sources`;
    const expected = `at most ${MOST_IMAGES} in all`;
    problems.push(errorAt('venue.reflectionOrder', found, expected, 'lower the order or merge faces'));
  }
  return problems;
}
