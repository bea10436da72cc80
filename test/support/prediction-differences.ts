/**
 * Where a prediction (JSON) departs from a reference by more than the tolerance of its unit, one line each. Only what
 * the reference holds is compared: further keys are allowed. Objects of a list are matched by what they are named.
 * With `tolerance` all figures have that one instead.
 */
export function predictionDifferences(
  found: unknown,
  reference: unknown,
  options: { tolerance?: number } = {},
  path = '',
  key = '',
): string[] {
  if (typeof reference === 'number' && typeof found === 'number') {
    const allowed = options.tolerance ?? toleranceOf(key, reference);
    const off = Math.abs(found - reference);
    return off <= allowed ? [] : [`${path}: found ${found}, reference ${reference}, off by ${off}, allowed ${allowed}`];
  }
  if (Array.isArray(reference)) {
    if (!Array.isArray(found) || found.length !== reference.length) return [`${path}: lists differ in length`];
    return reference.flatMap((item, i) => {
      const name = nameOf(item);
      if (name === null) return predictionDifferences(found[i], item, options, `${path}[${i}]`, key);
      const match = found.find((other) => nameOf(other) === name);
      return predictionDifferences(match, item, options, `${path}[${name}]`, key);
    });
  }
  if (typeof reference === 'object' && reference !== null) {
    if (typeof found !== 'object' || found === null) return [`${path}: not found`];
    return Object.entries(reference).flatMap(([name, item]) =>
      predictionDifferences((found as Record<string, unknown>)[name], item, options, `${path}.${name}`, name),
    );
  }
  return Object.is(found, reference) ? [] : [`${path}: found ${found}, reference ${reference}`];
}

const NAMES = ['id', 'microphone', 'loudspeaker', 'talker'] as const;

function nameOf(item: unknown): string | null {
  if (typeof item !== 'object' || item === null) return null;
  const parts = NAMES.flatMap((name) => (name in item ? [(item as Record<string, unknown>)[name]] : []));
  return parts.length === 0 ? null : parts.join('>');
}

/** Tolerances of the worked examples (data/reference/examples/README.md), by the unit the key carries. */
function toleranceOf(key: string, reference: number): number {
  if (/_dB_per_m$|_s$|_m2$|_m3$|_m_s$/.test(key)) return 0.002 * Math.abs(reference);
  if (/_dBA?$/.test(key)) return 0.05;
  if (/_ms$/.test(key)) return 0.5;
  if (/_W$/.test(key)) return 0.02 * Math.abs(reference);
  if (key === 'sti' || key === 'share') return 0.005;
  if (key === 'position') return 1e-6;
  if (key === 'limitingBand_Hz' || key === 'version') return 0;
  throw new Error(`No tolerance is known for "${key}".`);
}
