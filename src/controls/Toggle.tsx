import type { ReactNode } from 'react';

export interface ToggleProps {
  /** Accessible name where the words beside the box are not enough. */
  label?: string;
  children?: ReactNode;
  value: boolean;
  className?: string;
  onChange: (value: boolean) => void;
}

/** Something that is or is not. */
export function Toggle({ label, children, value, className = '', onChange }: ToggleProps) {
  return (
    <label className={`toggle ${className}`}>
      <input type="checkbox" aria-label={label} checked={value} onChange={(event) => onChange(event.target.checked)} />
      {children}
    </label>
  );
}
