import { Dialog, Heading, Modal, ModalOverlay } from 'react-aria-components';
import { dismiss, useNotice } from './notice';

/** The notice over the sheet, where there is one. */
export default function NoticeBox() {
  const notice = useNotice((notices) => notices.notice);
  return (
    <ModalOverlay className="veil" isOpen={notice !== null} onOpenChange={(open) => !open && dismiss()} isDismissable>
      <Modal className="notice">
        <Dialog role="alertdialog">
          <Heading slot="title">{notice?.title}</Heading>
          {notice?.lines.map((line) => (
            <p key={line} className="say">
              {line}
            </p>
          ))}
          <div className="notice-choices">
            {notice?.choices.map((choice) => (
              <button
                key={choice.label}
                type="button"
                className={choice.main ? 'act main' : 'act'}
                // biome-ignore lint/a11y/noAutofocus: a dialog opens on its safe answer
                autoFocus={choice.main}
                onClick={() => {
                  dismiss();
                  choice.run?.();
                }}
              >
                {choice.label}
              </button>
            ))}
          </div>
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
}
