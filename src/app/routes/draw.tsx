import { CautionLine } from '#src/components/caution-line.tsx';
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
      <main className="draw-stage" />
      <footer className="draw-caution">
        <CautionLine form={layout === 'desk' ? 'whole' : 'half'} />
      </footer>
    </div>
  );
}
