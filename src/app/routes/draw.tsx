import { CautionLine } from '#src/components/caution-line.tsx';
import { DrawStage } from '#src/features/drawing/draw-stage.tsx';
import { useLayout } from '#src/lib/layout.ts';
import { NoticeStrip } from '../notice-strip.tsx';
import { TopLine } from '../top-line.tsx';

/** The Draw stage: the circuit grows from its open ports. */
export function DrawRoute() {
  const layout = useLayout();
  return (
    <div className={`screen screen-${layout} screen-draw`}>
      <TopLine screen="draw" />
      <NoticeStrip />
      <DrawStage />
      <footer className="draw-caution">
        <CautionLine form={layout === 'desk' ? 'whole' : 'half'} />
      </footer>
    </div>
  );
}
