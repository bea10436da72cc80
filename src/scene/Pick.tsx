import { Button, ListBox, ListBoxItem, Popover, Select, SelectValue } from 'react-aria-components';

interface PickProps {
  /** What is chosen, in a word. */
  label: string;
  /** The word is heard but not shown. */
  quiet: boolean;
  options: readonly { id: string; text: string }[];
  value: string;
  onChange: (id: string) => void;
}

/** One of several, chosen from a list that opens over the sheet. */
export default function Pick({ label, quiet, options, value, onChange }: PickProps) {
  return (
    <Select aria-label={label} value={value} onChange={(key) => onChange(String(key))} className="room-pick">
      <Button className="pick">
        {!quiet && <small>{label}</small>}
        <SelectValue>{options.find(({ id }) => id === value)?.text ?? '–'}</SelectValue>
      </Button>
      <Popover placement="bottom end">
        <ListBox className="menu" items={options}>
          {({ id, text }) => (
            <ListBoxItem id={id} textValue={text}>
              {text}
            </ListBoxItem>
          )}
        </ListBox>
      </Popover>
    </Select>
  );
}
