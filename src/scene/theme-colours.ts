import { useSyncExternalStore } from 'react';
import { type ColourScale, createColourScale, linearOfHex, type Rgb } from './colour-scale';

const TOKENS = [
  'paper',
  'raised',
  'well',
  'ink',
  'ink-2',
  'ink-3',
  'accent',
  'hair',
  'hair-2',
  'poche',
  'card-floor',
  'card-a',
  'card-b',
  'card-glass',
  'card-edge',
  'card-timber',
  'mark',
] as const;
export type Token = (typeof TOKENS)[number];

/** What the drawing is coloured with, read from the style sheet. */
export interface ThemeColours {
  css: Readonly<Record<Token, string>>;
  linear: Readonly<Record<Token, Rgb>>;
  scale: ColourScale;
}

/** The colours of the theme shown; another object after each change of theme. */
export function useThemeColours(): ThemeColours {
  return useSyncExternalStore(subscribe, current);
}

let kept: { theme: string | undefined; colours: ThemeColours } | null = null;

function current(): ThemeColours {
  const { theme } = document.documentElement.dataset;
  if (kept === null || kept.theme !== theme) kept = { theme, colours: readColours() };
  return kept.colours;
}

function subscribe(notify: () => void): () => void {
  const observer = new MutationObserver(notify);
  observer.observe(document.documentElement, { attributes: true, attributeFilter: ['data-theme'] });
  return () => observer.disconnect();
}

function readColours(): ThemeColours {
  const style = getComputedStyle(document.documentElement);
  const read = (name: string): string => style.getPropertyValue(`--${name}`).trim();
  const css = Object.fromEntries(TOKENS.map((token) => [token, read(token)])) as Record<Token, string>;
  const linear = Object.fromEntries(TOKENS.map((token) => [token, linearOfHex(css[token])])) as Record<Token, Rgb>;
  const scale = createColourScale({
    short: ['short-0', 'short-1', 'short-3', 'short-6'].map(read),
    hand: ['hand-0', 'hand-1', 'hand-3', 'hand-6'].map(read),
    wash: ['wash-1', 'wash-2', 'wash-3', 'wash-4', 'wash-5'].map(read),
  });
  return { css, linear, scale };
}
