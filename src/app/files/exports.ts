import { schematicPicture } from '#shared/pictures/schematic.ts';
import type { Picture } from '#shared/pictures/shape.ts';
import { pictureToSvg } from '#shared/pictures/svg.ts';
import { channelOf, valueAt } from '#shared/simulation/result.ts';
import { download, fileName, svgToPng } from '#src/lib/download.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useRuns } from '#src/stores/run-store.ts';

/** Pixels per module of the exported drawing. */
const MODULE = 10;

async function hand(picture: Picture, scale: number, what: string, ending: 'svg' | 'png'): Promise<void> {
  const { title } = useDocument.getState().document;
  const svg = pictureToSvg(picture, 'light', { scale, ground: 'sheet' });
  if (ending === 'svg') return download(fileName(title, what, 'svg'), svg, 'image/svg+xml');
  download(fileName(title, what, 'png'), await svgToPng(svg, picture.width * scale, picture.height * scale));
}

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
  await hand(schematicPicture(document, activeCase, readings, { inkScale }), MODULE, 'drawing', ending);
}
