import { useNavigate } from 'react-router-dom';
import type { MenuEntry } from '#src/components/lazy-menu.tsx';
import { showDialog } from '#src/stores/dialog-store.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { openNameplate } from '#src/stores/nameplate-store.ts';
import { usePreferences } from '#src/stores/preferences-store.ts';
import { openFile, saveCircuit } from './files/circuit-file.ts';
import { exportDrawing } from './files/exports.ts';

const themes = { auto: 'Theme: as the system', light: 'Theme: light', dark: 'Theme: dark' } as const;
const nextTheme = { auto: 'light', light: 'dark', dark: 'auto' } as const;

/** Everything that is not on the sheet itself. On the phone the other screen stands here too. */
export function useMainMenu(screen: 'bench' | 'draw' | null): readonly MenuEntry[] {
  const navigate = useNavigate();
  const theme = usePreferences((state) => state.theme);
  const projector = usePreferences((state) => state.projector);
  const motion = usePreferences((state) => state.motion);
  const set = usePreferences((state) => state.set);
  const undo = useDocument((state) => state.past.length > 0);
  const redo = useDocument((state) => state.future.length > 0);
  const go = (path: string) => () => void navigate(path);
  const plates: readonly MenuEntry[] = [
    { id: 'fluid', label: 'Fluid and tank', onAction: () => openNameplate('fluid') },
    { id: 'supply', label: 'Supply and site', onAction: () => openNameplate('supply') },
    { id: 'duty', label: 'Duty', onAction: () => openNameplate('duty') },
    { id: 'requirements', label: 'Requirements', onAction: () => openNameplate('requirements') },
    { rule: 'plates' },
  ];
  const screens: readonly MenuEntry[] =
    screen === null
      ? []
      : [
          screen === 'bench' ? { id: 'draw', label: 'Draw', onAction: go('/draw') } : { id: 'bench', label: 'Bench', onAction: go('/') },
          { rule: 'screens' },
        ];
  return [
    ...screens,
    { id: 'new', label: 'New circuit\u2026', onAction: go('/start') },
    { id: 'open', label: 'Open a file\u2026', onAction: () => void openFile() },
    { id: 'save', label: 'Save as a file', onAction: saveCircuit },
    { rule: 'file' },
    { id: 'undo', label: 'Undo', hint: 'Ctrl Z', disabled: !undo, onAction: () => useDocument.getState().undo() },
    { id: 'redo', label: 'Redo', hint: 'Ctrl Y', disabled: !redo, onAction: () => useDocument.getState().redo() },
    { rule: 'history' },
    ...plates,
    { id: 'drawing-svg', label: 'Export drawing', hint: 'SVG', onAction: () => void exportDrawing('svg') },
    { id: 'drawing-png', label: 'Export drawing', hint: 'PNG', onAction: () => void exportDrawing('png') },
    { id: 'print', label: 'Print', hint: 'A4', onAction: () => window.setTimeout(() => window.print(), 50) },
    { rule: 'export' },
    { id: 'units', label: 'Units\u2026', onAction: () => showDialog({ id: 'units' }) },
    { id: 'theme', label: themes[theme], onAction: () => set({ theme: nextTheme[theme] }) },
    {
      id: 'motion',
      label: motion === 'reduced' ? 'Movement: kept still' : 'Movement: as the system',
      onAction: () => set({ motion: motion === 'reduced' ? 'auto' : 'reduced' }),
    },
    { id: 'projector', label: projector ? 'Projector size: on' : 'Projector size: off', onAction: () => set({ projector: !projector }) },
    { id: 'keys', label: 'Key list', hint: '?', onAction: () => showDialog({ id: 'keys' }) },
    { id: 'about', label: 'About and cautions', onAction: () => showDialog({ id: 'about' }) },
  ];
}
