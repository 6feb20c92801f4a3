import { Link, useNavigate } from 'react-router-dom';
import { emptyCircuit } from '#shared/circuit/edit/empty-circuit.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { starters } from '#shared/circuit/samples/starters.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { schematicPicture } from '#shared/pictures/schematic.ts';
import { pictureToSvg } from '#shared/pictures/svg.ts';
import { CautionLine } from '#src/components/caution-line.tsx';
import { useLayout } from '#src/lib/layout.ts';
import { useTheme } from '#src/lib/theme.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useKeeping } from '#src/stores/keeping-store.ts';
import { openFile } from '../files/circuit-file.ts';
import { TopLine } from '../top-line.tsx';

const demoAbout = 'Three weeks after a new pump was fitted the motor stalls on the bale. Three cases to compare.';

/** A new circuit: an empty sheet, a starter, or the worked demo. The circuit in hand can be had back by undo. */
export function StartRoute() {
  const navigate = useNavigate();
  const layout = useLayout();

  function take(document: CircuitDocument, path: string) {
    useDocument.getState().edit(() => document);
    const [first, second] = document.cases;
    if (first) useDocument.getState().setActiveCase((second ?? first).id);
    if (first && second) useDocument.getState().toggleOverlay(first.id);
    useKeeping.getState().setNotice('A new circuit is in hand. Undo brings the former one back.');
    void navigate(path);
  }

  return (
    <div className="screen screen-start">
      <TopLine screen="draw" />
      <main className="start">
        <h2 className="text-22">New circuit</h2>
        <p>
          Start from an empty sheet and let the circuit grow from its open ports, or from one that already runs.{' '}
          <Link to="/">Back to the circuit in hand</Link>
        </p>
        <ul className="start-list">
          <li>
            <button type="button" className="start-card" onClick={() => take(emptyCircuit(), '/draw')}>
              <span className="start-picture start-empty" />
              <strong>Empty sheet</strong>
              <span>Nothing on it yet: take the first part from the drawer.</span>
            </button>
          </li>
          {starters.map((starter) => (
            <li key={starter.id}>
              <button type="button" className="start-card" onClick={() => take(starter.document, '/')}>
                <Thumbnail document={starter.document} />
                <strong>{starter.title}</strong>
                <span>{starter.about}</span>
              </button>
            </li>
          ))}
          <li>
            <button type="button" className="start-card" onClick={() => take(demoCircuit, '/')}>
              <Thumbnail document={demoCircuit} />
              <strong>Demo: {demoCircuit.title}</strong>
              <span>{demoAbout}</span>
            </button>
          </li>
        </ul>
        <button type="button" className="button" onClick={() => void openFile().then(() => undefined)}>
          Open a file
        </button>
      </main>
      <footer className="draw-caution">
        <CautionLine form={layout === 'desk' ? 'whole' : 'half'} />
      </footer>
    </div>
  );
}

function Thumbnail({ document }: { readonly document: CircuitDocument }) {
  const theme = useTheme();
  const svg = pictureToSvg(schematicPicture(document, document.cases[0]?.id ?? 'a', null, { plain: true }), theme, { scale: 6 });
  return <img className="start-picture" alt="" src={`data:image/svg+xml,${encodeURIComponent(svg)}`} />;
}
