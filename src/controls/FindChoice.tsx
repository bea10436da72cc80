import { useState } from 'react';
import { Button, ComboBox, Input } from 'react-aria-components';
import { type ChoiceProps, OptionList } from './Choice';

/** One of many: type a part of its name, or open the list. Leaving keeps what was chosen. */
export function FindChoice({ label, name, value, options, placeholder, className = '', onChange }: ChoiceProps) {
  const chosen = options.find((option) => option.id === value);
  const listed = chosen === undefined && value !== '' ? [{ id: value, label: value }, ...options] : options;
  const [open, setOpen] = useState(false);
  return (
    <ComboBox
      className={`field ${className}`}
      aria-label={label}
      defaultItems={listed}
      value={value === '' ? null : value}
      onOpenChange={setOpen}
      onChange={(key) => key !== null && key !== value && onChange(String(key))}
    >
      <span>
        {name !== undefined && (
          <span className="field-name" aria-hidden="true">
            {name}
          </span>
        )}
        <Input
          className="txt"
          placeholder={placeholder}
          onFocus={(event) => event.target.select()}
          data-dirty={open || undefined}
        />
        <Button className="field-open" aria-label={`${label}, all`}>
          <i aria-hidden="true" />
        </Button>
      </span>
      <OptionList label={label} />
    </ComboBox>
  );
}
