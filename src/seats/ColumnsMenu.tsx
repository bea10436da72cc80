import { Button, Header, Menu, MenuItem, MenuSection, MenuTrigger, Popover } from 'react-aria-components';
import { SEAT_COLUMNS } from './columns';
import { keepHiddenColumns, USUALLY_HIDDEN } from './kept-columns';
import type { SeatGrid } from './seat-grid';

/** A seat's id always stays: the other figures are nothing without it. */
const FIXED = 'seat';
const GROUPS = [...new Set(SEAT_COLUMNS.map((column) => column.group))];
const CHOICES = SEAT_COLUMNS.filter((column) => column.id !== FIXED);

/** Which columns the table shows. */
export default function ColumnsMenu({ grid }: { grid: SeatGrid }) {
  const shown = CHOICES.filter((column) => grid.getColumn(column.id)?.getIsVisible()).map((column) => column.id);
  const show = (ids: ReadonlySet<unknown>) => {
    grid.setColumnVisibility(Object.fromEntries(CHOICES.map(({ id }) => [id, ids.has(id)])));
    keepHiddenColumns(CHOICES.map(({ id }) => id).filter((id) => !ids.has(id)));
  };
  return (
    <MenuTrigger>
      <Button className="act">Columns</Button>
      <Popover offset={1} placement="bottom end">
        <Menu className="menu seats-columns" aria-label="Columns">
          {GROUPS.map((group) => (
            <MenuSection
              key={group}
              aria-label={group || 'The seat'}
              selectionMode="multiple"
              selectedKeys={shown}
              onSelectionChange={(keys) => {
                const inGroup = CHOICES.filter((column) => column.group === group).map(({ id }) => id);
                const kept = shown.filter((id) => !inGroup.includes(id));
                show(new Set([...kept, ...inGroup.filter((id) => keys === 'all' || keys.has(id))]));
              }}
            >
              {group !== '' && <Header>{group}</Header>}
              {CHOICES.filter((column) => column.group === group).map((column) => (
                <MenuItem key={column.id} id={column.id} textValue={`${group} ${column.label}`}>
                  <i className="seats-tick" aria-hidden="true" />
                  {column.label}
                  {column.unit !== '' && <span className="u">{column.unit}</span>}
                </MenuItem>
              ))}
            </MenuSection>
          ))}
          <MenuItem
            id="usual"
            onAction={() => show(new Set(CHOICES.map(({ id }) => id).filter((id) => !USUALLY_HIDDEN.includes(id))))}
          >
            The usual columns
          </MenuItem>
        </Menu>
      </Popover>
    </MenuTrigger>
  );
}
