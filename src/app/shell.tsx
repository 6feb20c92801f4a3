import { lazy, Suspense, useEffect } from 'react';
import { Outlet } from 'react-router-dom';
import { startRunController } from '#src/features/run/run-controller.ts';
import { useExplain } from '#src/stores/explain-store.ts';
import { DialogHost } from './dialogs/dialog-host.tsx';
import { keepDraft } from './keep-draft.ts';

const ExplainPanel = lazy(async () => ({ default: (await import('#src/features/nameplate/explain-panel.tsx')).ExplainPanel }));

/** What every screen shares: the draft of this device, the runs of the circuit in hand, the one open dialog. */
export function Shell() {
  const explaining = useExplain((state) => state.address !== null);
  useEffect(() => keepDraft(), []);
  useEffect(() => startRunController(), []);
  return (
    <>
      <Outlet />
      <DialogHost />
      {explaining && (
        <Suspense fallback={null}>
          <ExplainPanel />
        </Suspense>
      )}
    </>
  );
}
