import { type ReactNode, useId } from 'react';

export interface ActionProps {
  children: ReactNode;
  /** Accessible name where the words shown are not enough. */
  label?: string;
  /** Why it cannot be done now, null or left out where it can. It stays reachable, so that the reason can be read. */
  why?: string | null;
  /** `act`: a word in a bar; `use`: a link-like word in a line. */
  look?: 'act' | 'use';
  className?: string;
  onPress: () => void;
}

/** A word that does something. */
export function Action({ children, label, why = null, look = 'act', className = '', onPress }: ActionProps) {
  const whyId = useId();
  return (
    <button
      type="button"
      className={`${look} ${className}`}
      aria-label={label}
      aria-disabled={why !== null || undefined}
      aria-describedby={why === null ? undefined : whyId}
      title={why ?? undefined}
      onClick={() => why === null && onPress()}
    >
      {children}
      {why !== null && (
        <span className="unseen" id={whyId}>
          {why}
        </span>
      )}
    </button>
  );
}
