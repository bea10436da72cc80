import { Button, ListBox, ListBoxItem, Popover, Select, SelectValue } from 'react-aria-components';

export interface Option {
  id: string;
  label: string;
  /** Small words beside the label. */
  detail?: string;
}

export interface ChoiceProps {
  /** Accessible name. */
  label: string;
  /** Short visible name. */
  name?: string;
  value: string;
  options: readonly Option[];
  /** Shown where nothing is chosen. */
  placeholder?: string;
  className?: string;
  onChange: (id: string) => void;
}

/** One of a few, from a list that opens. */
export function Choice({ label, name, value, options, className = '', onChange }: ChoiceProps) {
  return (
    <Select
      className={`field ${className}`}
      aria-label={label}
      value={value}
      onChange={(key) => key !== null && key !== value && onChange(String(key))}
    >
      <Button className="field-pick">
        {name !== undefined && (
          <span className="field-name" aria-hidden="true">
            {name}
          </span>
        )}
        <SelectValue>{({ selectedText }) => selectedText ?? value}</SelectValue>
      </Button>
      <OptionList options={options} label={label} />
    </Select>
  );
}

/** The list that opens under a choice. */
export function OptionList({ options, label }: { options?: readonly Option[]; label: string }) {
  const row = (option: Option) => (
    <ListBoxItem id={option.id} textValue={option.label}>
      <span>{option.label}</span>
      {option.detail !== undefined && <span className="u">{option.detail}</span>}
    </ListBoxItem>
  );
  return (
    <Popover className="field-menu" offset={1}>
      <ListBox className="menu" aria-label={label} {...(options && { items: options })} renderEmptyState={() => 'None'}>
        {row}
      </ListBox>
    </Popover>
  );
}
