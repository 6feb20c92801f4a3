import { CautionLine } from '#src/components/caution-line.tsx';
import { ErrorRegion } from '#src/components/error-region.tsx';
import { DrawStage } from '#src/features/drawing/draw-stage.tsx';
import { NameplateLayer } from '#src/features/nameplate/nameplate-layer.tsx';
import { useLayout } from '#src/lib/layout.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { NoticeStrip } from '../notice-strip.tsx';
import { TopLine } from '../top-line.tsx';

/** The Draw stage: the circuit grows from its open ports. */
export function DrawRoute() {
  const layout = useLayout();
  const document = useDocument((state) => state.document);
  return (
    <div className={`screen screen-${layout} screen-draw`}>
      <TopLine screen="draw" />
      <NoticeStrip />
      <main className="draw-stage">
        <ErrorRegion name="The Draw stage" resetOn={[document]}>
          <DrawStage>
            <NameplateLayer />
          </DrawStage>
        </ErrorRegion>
      </main>
      <footer className="draw-caution">
        <CautionLine form={layout === 'desk' ? 'whole' : 'half'} />
      </footer>
    </div>
  );
}
