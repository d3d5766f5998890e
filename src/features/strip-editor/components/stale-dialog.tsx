import type { Strip } from '../../../../shared/api/strips';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';

interface StaleDialogProps {
  current: Strip;
  onKeepCopy(): void;
  onTakeTheirs(): void;
  onClose(): void;
}

/** Somebody saved in between: nothing is lost, and the person decides. */
export function StaleDialog({ current, onKeepCopy, onTakeTheirs, onClose }: StaleDialogProps) {
  return (
    <Dialog
      open
      title="Not saved: someone saved in between"
      description={`Version ${current.version} of “${current.title}” was saved meanwhile. Your changes are still here.`}
      onClose={onClose}
    >
      <div className="mt-5 flex flex-col gap-2.5">
        <Button onClick={onClose}>Keep editing</Button>
        <Button kind="primary" onClick={onKeepCopy}>
          Save mine as a new strip
        </Button>
        <Button kind="danger" onClick={onTakeTheirs}>
          Drop mine and load version {current.version}
        </Button>
      </div>
    </Dialog>
  );
}
