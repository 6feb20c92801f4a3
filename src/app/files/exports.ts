import { schematicPicture } from '#shared/pictures/schematic.ts';
import { pictureToSvg } from '#shared/pictures/svg.ts';
import { channelOf, valueAt } from '#shared/simulation/result.ts';
import { fileName, saveFile, svgToPng } from '#src/lib/save-file.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useRuns } from '#src/stores/run-store.ts';

/** Pixels per module of the exported drawing. */
const MODULE = 10;

/** The drawing with the case on it, at the cursor's moment. */
export async function exportDrawing(ending: 'svg' | 'png'): Promise<void> {
  const { document, activeCase } = useDocument.getState();
  const { byCase, inkScale } = useRuns.getState();
  const { time } = useCursor.getState();
  const run = byCase[activeCase]?.run ?? null;
  const readings =
    run &&
    ((address: string) => {
      const channel = channelOf(run, address);
      return channel ? valueAt(run.times, channel.values, time) : undefined;
    });
  const picture = schematicPicture(document, activeCase, readings, { inkScale, notes: true });
  const svg = pictureToSvg(picture, 'light', { scale: MODULE, ground: 'sheet' });
  const name = fileName(`${document.title} drawing`, ending);
  if (ending === 'svg') saveFile(name, svg, 'image/svg+xml');
  else saveFile(name, await svgToPng(svg, picture.width * MODULE, picture.height * MODULE, 2), 'image/png');
}
