import { useRouteError } from 'react-router-dom';
import { saveCircuit } from './files/circuit-file.ts';

/** The outermost fault: the page never goes white, and the circuit in hand can be saved from here. */
export function RouteError() {
  const error = useRouteError();
  return (
    <main className="plain-page" role="alert">
      <h1 className="text-22">This screen could not be shown</h1>
      <p>The circuit is kept on this device. Open the page again; if it happens once more, save the circuit as a file first.</p>
      <p className="text-13 text-ink2">{error instanceof Error ? error.message : String(error)}</p>
      <div className="finding-actions">
        <button type="button" className="button-primary" onClick={() => window.location.reload()}>
          Open the page again
        </button>
        <button type="button" className="button" onClick={saveCircuit}>
          Save as a file
        </button>
      </div>
    </main>
  );
}
