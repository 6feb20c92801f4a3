import { starters } from '#shared/circuit/samples/starters.ts';
import { schematicPicture } from '#shared/pictures/schematic.ts';
import { pictureToSvg } from '#shared/pictures/svg.ts';
import { SymbolIcon } from '#src/components/schematic/symbol-icon.tsx';
import { useTheme } from '#src/lib/theme.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { startWithPump } from './actions.ts';
import { say, useDrawing } from './drawing-store.ts';

/** What an empty sheet offers: a motor, a pump and a ring to touch, or a circuit that already runs. */
export function EmptySheet({ onTaken }: { readonly onTaken: () => void }) {
  const theme = useTheme();
  const placing = useDrawing((state) => state.placing);
  // A part in hand goes where it is put.
  if (placing) return null;
  return (
    <section className="empty-sheet" aria-label="Begin">
      <button
        type="button"
        className="empty-pump"
        onClick={() => {
          startWithPump({ x: 20, y: 20 });
          onTaken();
        }}
      >
        <span className="empty-picture" aria-hidden="true">
          <SymbolIcon kind="electric-motor" width={110} height={96} />
          <span className="empty-shaft" />
          <SymbolIcon kind="compensated-pump" width={130} height={120} />
          <span className="empty-ring" />
        </span>
        <strong>Begin with a motor and a pump</strong>
        <span>The circuit grows from the open ring.</span>
      </button>
      <div className="empty-starters">
        <h3>Or start from a circuit that runs</h3>
        <ul>
          {starters.map((starter) => (
            <li key={starter.id}>
              <button
                type="button"
                className="starter"
                onClick={() => {
                  useDocument.getState().edit(() => starter.document);
                  say(`${starter.title} is on the sheet`);
                  onTaken();
                }}
              >
                <img
                  alt=""
                  src={`data:image/svg+xml,${encodeURIComponent(
                    pictureToSvg(schematicPicture(starter.document, starter.document.cases[0]?.id ?? 'a', null, { plain: true }), theme, {
                      scale: 6,
                    }),
                  )}`}
                />
                <span>
                  <strong>{starter.title}</strong>
                  <span>{starter.about}</span>
                </span>
              </button>
            </li>
          ))}
        </ul>
      </div>
    </section>
  );
}
