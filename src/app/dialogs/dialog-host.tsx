import { Suspense } from 'react';
import { ErrorRegion } from '#src/components/error-region.tsx';
import { later } from '#src/components/later.ts';
import { useDialog } from '#src/stores/dialog-store.ts';

const UnitsDialog = later(async () => (await import('#src/features/settings/units-dialog.tsx')).UnitsDialog);
const KeysDialog = later(async () => (await import('#src/features/settings/keys-dialog.tsx')).KeysDialog);
const AboutDialog = later(async () => (await import('#src/features/settings/about-dialog.tsx')).AboutDialog);
const DifferenceDialog = later(async () => (await import('#src/features/cases/difference-dialog.tsx')).DifferenceDialog);
const DeleteCaseDialog = later(async () => (await import('#src/features/cases/delete-case-dialog.tsx')).DeleteCaseDialog);
const RefusedFileDialog = later(async () => (await import('./refused-file-dialog.tsx')).RefusedFileDialog);

/** The one open dialog; each is loaded when it is first asked for. */
export function DialogHost() {
  const dialog = useDialog((state) => state.dialog);
  const close = useDialog((state) => state.close);
  if (!dialog) return null;
  return (
    <ErrorRegion name="This sheet" resetOn={[dialog]}>
      <Suspense fallback={null}>
        {dialog.id === 'units' && <UnitsDialog onClose={close} />}
        {dialog.id === 'keys' && <KeysDialog onClose={close} />}
        {dialog.id === 'about' && <AboutDialog onClose={close} />}
        {dialog.id === 'difference' && <DifferenceDialog caseId={dialog.caseId} onClose={close} />}
        {dialog.id === 'delete-case' && <DeleteCaseDialog caseId={dialog.caseId} onClose={close} />}
        {dialog.id === 'refused-file' && <RefusedFileDialog file={dialog.file} issues={dialog.issues} onClose={close} />}
      </Suspense>
    </ErrorRegion>
  );
}
