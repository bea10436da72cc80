import type { ReactNode } from 'react';
import type { ViewKind } from './views';

/** Small drawings of the ways of looking, on a field of 16. */
export const VIEW_ICONS: Readonly<Record<Exclude<ViewKind, 'saved'>, ReactNode>> = {
  orbit: icon('M2.5 5 8 2.5 13.5 5v6L8 13.5 2.5 11zM2.5 5 8 7.5 13.5 5M8 7.5v6'),
  plan: icon('M2 3.5h12v9H2zM5 6h4v4H5z'),
  'long-section': icon('M1 12.5h14M2.5 12.5v-7h11v7M1 3h3M12 3h3'),
  'cross-section': icon('M3 12.5h10M4.5 12.5v-7h7v7M8 1v3'),
  seat: icon(
    'M1.5 8S4 3.8 8 3.8 14.5 8 14.5 8 12 12.2 8 12.2 1.5 8 1.5 8zM6.2 8a1.8 1.8 0 1 0 3.6 0a1.8 1.8 0 1 0-3.6 0',
  ),
  aim: icon('M3.5 8a4.5 4.5 0 1 0 9 0a4.5 4.5 0 1 0-9 0M8 1v5M8 10v5M1 8h5M10 8h5'),
};

function icon(path: string): ReactNode {
  return (
    <svg viewBox="0 0 16 16" aria-hidden="true">
      <path d={path} />
    </svg>
  );
}
