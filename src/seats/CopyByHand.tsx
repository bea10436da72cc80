import { Dialog, Heading, Modal, ModalOverlay } from 'react-aria-components';

/** The rows as a text to copy with the keyboard, where the browser lets no page write to the clipboard. */
export default function CopyByHand({ text, close }: { text: string; close: () => void }) {
  return (
    <ModalOverlay className="seats-veil" isOpen isDismissable onOpenChange={close}>
      <Modal className="seats-byhand">
        <Dialog>
          <Heading slot="title">The browser keeps its clipboard closed</Heading>
          <p>The rows are selected below: copy them with Ctrl C or ⌘ C.</p>
          <textarea
            readOnly
            aria-label="Rows, tab-separated"
            value={text}
            autoFocus
            onFocus={(event) => event.target.select()}
          />
          <button type="button" className="act main" onClick={close}>
            Close
          </button>
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
}
