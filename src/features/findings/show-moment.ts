import type { Finding } from '#shared/findings/finding.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { useDocument } from '#src/stores/document-store.ts';

/** Puts the finding's case on the drawing and the cursor on its moment. The former case stays overlaid. */
export function showMoment(finding: Finding): void {
  const { activeCase, setActiveCase, toggleOverlay } = useDocument.getState();
  if (finding.caseId !== activeCase) {
    setActiveCase(finding.caseId);
    if (!useDocument.getState().overlays.includes(activeCase)) toggleOverlay(activeCase);
  }
  if (finding.time === undefined) return;
  const { setPlaying, setTime } = useCursor.getState();
  setPlaying(false);
  setTime(finding.time);
}
