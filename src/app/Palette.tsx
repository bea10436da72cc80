import {
  Autocomplete,
  Dialog,
  Input,
  Menu,
  MenuItem,
  Modal,
  ModalOverlay,
  TextField,
  useFilter,
} from 'react-aria-components';
import { useSession } from '../session/session';
import { allActions } from './actions';
import { runAction, sayKeys } from './shortcuts';

/** Every action by name. Type part of it, Enter runs it. */
export default function Palette({ isOpen, close }: { isOpen: boolean; close: () => void }) {
  return (
    <ModalOverlay className="veil" isOpen={isOpen} onOpenChange={(open) => !open && close()} isDismissable>
      <Modal className="palette">
        <Dialog aria-label="Find an action">
          <PaletteList close={close} />
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
}

function PaletteList({ close }: { close: () => void }) {
  const { contains } = useFilter({ sensitivity: 'base' });
  const actions = allActions();
  const session = useSession.getState();
  const words = (text: string, typed: string) => typed.split(/\s+/).every((word) => contains(text, word));
  const run = (id: string) => {
    const action = actions.find((candidate) => candidate.id === id);
    close();
    // After the palette has given focus back.
    if (action !== undefined) setTimeout(() => runAction(action));
  };
  return (
    <Autocomplete filter={words}>
      <TextField aria-label="Name of the action" autoFocus>
        <Input className="palette-input" placeholder="What do you want to do?" />
      </TextField>
      <Menu
        className="menu palette-menu"
        aria-label="Actions"
        items={actions}
        onAction={(id) => run(String(id))}
        renderEmptyState={() => <p className="palette-none">No action of that name.</p>}
      >
        {(action) => {
          const why = action.unavailable?.(session) ?? null;
          return (
            <MenuItem id={action.id} textValue={action.label} isDisabled={why !== null}>
              <span>{action.label}</span>
              {why !== null && <span className="dimmed palette-why">{why}</span>}
              {action.keys !== undefined && <kbd className="palette-keys">{sayKeys(action.keys[0])}</kbd>}
            </MenuItem>
          );
        }}
      </Menu>
    </Autocomplete>
  );
}
