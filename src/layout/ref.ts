/** Names one thing of a layout, or one of its seats. Things of a scheme are those of the scheme shown. */
export interface Ref {
  kind: RefKind;
  /** Empty for things there is only one of. */
  id: string;
}

export type RefKind =
  | 'venue'
  | 'scheme'
  | 'talker'
  | 'microphone'
  | 'loudspeaker'
  | 'seating'
  | 'seat'
  | 'face'
  | 'finish'
  | 'view'
  | 'system'
  | 'routing';

export const sameRef = (a: Ref | null, b: Ref | null): boolean =>
  a === b || (a !== null && b !== null && a.kind === b.kind && a.id === b.id);
