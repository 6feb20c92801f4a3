import { Suspense, useEffect } from 'react';
import { Outlet } from 'react-router-dom';
import { ErrorRegion } from '#src/components/error-region.tsx';
import { later } from '#src/components/later.ts';
import { startRunController } from '#src/features/run/run-controller.ts';
import { loadLater } from '#src/lib/idle.ts';
import { useExplain } from '#src/stores/explain-store.ts';
import { DialogHost } from './dialogs/dialog-host.tsx';
import { keepDraft } from './keep-draft.ts';

/** Everything that is not on the first view. */
const rest = [
  () => import('#src/components/menu.tsx'),
  () => import('#src/features/tape/flag-editor.tsx'),
  () => import('#src/features/tape/tape-menus.tsx'),
  () => import('#src/features/nameplate/nameplate-layer.tsx'),
  () => import('#src/features/nameplate/explain-panel.tsx'),
  () => import('#src/features/settings/units-dialog.tsx'),
  () => import('#src/features/settings/keys-dialog.tsx'),
  () => import('#src/features/settings/about-dialog.tsx'),
  () => import('#src/features/cases/difference-dialog.tsx'),
  () => import('#src/features/cases/delete-case-dialog.tsx'),
  () => import('./dialogs/refused-file-dialog.tsx'),
  () => import('./routes/draw.tsx'),
  () => import('./routes/start.tsx'),
];

const ExplainPanel = later(async () => (await import('#src/features/nameplate/explain-panel.tsx')).ExplainPanel);

/** What every screen shares: the draft of this device, the runs of the circuit in hand, the one open dialog. */
export function Shell() {
  const explaining = useExplain((state) => state.address !== null);
  useEffect(() => keepDraft(), []);
  useEffect(() => startRunController(), []);
  useEffect(() => loadLater(rest), []);
  return (
    <>
      <Outlet />
      <DialogHost />
      {explaining && (
        <ErrorRegion name="The explanation" resetOn={[explaining]}>
          <Suspense fallback={null}>
            <ExplainPanel />
          </Suspense>
        </ErrorRegion>
      )}
    </>
  );
}
