import { useEffect } from 'react';
import { Outlet } from 'react-router-dom';
import { startRunController } from '#src/features/run/run-controller.ts';
import { DialogHost } from './dialogs/dialog-host.tsx';
import { keepDraft } from './keep-draft.ts';

/** What every screen shares: the draft of this device, the runs of the circuit in hand, the one open dialog. */
export function Shell() {
  useEffect(() => keepDraft(), []);
  useEffect(() => startRunController(), []);
  return (
    <>
      <Outlet />
      <DialogHost />
    </>
  );
}
