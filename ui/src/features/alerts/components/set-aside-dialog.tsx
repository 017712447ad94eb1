import { Dialog, DialogBody } from '@blueprintjs/core';
import type { WireAlert } from '@stubpost/shared';
import styles from './alert-forms.module.css';
import { SetAsideForm } from './set-aside-form';

export interface SetAsideDialogProps {
  /** The alert to set aside; null closes the dialog. */
  alert: WireAlert | null;
  zone: string;
  onClose: () => void;
}

/** Sets an alert aside from the board, where its line has no room for the form. */
export function SetAsideDialog({ alert, zone, onClose }: SetAsideDialogProps) {
  return (
    <Dialog
      isOpen={alert !== null}
      onClose={onClose}
      title="Set aside"
      className={styles.dialog}
      shouldReturnFocusOnClose={false}
      transitionDuration={0}
    >
      <DialogBody>
        {alert !== null && (
          <>
            <p>
              <b>{alert.subject}.</b> {alert.text}
            </p>
            <SetAsideForm alert={alert} zone={zone} onDone={onClose} />
          </>
        )}
      </DialogBody>
    </Dialog>
  );
}
