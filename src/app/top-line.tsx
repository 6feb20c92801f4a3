import { Link, NavLink } from 'react-router-dom';
import { Icon, Mark } from '#src/components/icons.tsx';
import { LazyMenu } from '#src/components/lazy-menu.tsx';
import { useLayout } from '#src/lib/layout.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { keepingWords, useKeeping } from '#src/stores/keeping-store.ts';
import { CircuitTitle } from './circuit-title.tsx';
import { useMainMenu } from './main-menu.ts';

/** Mark and word, the circuit's title, where it is kept, the screens that exist, the menu. */
export function TopLine({ screen }: { readonly screen: 'bench' | 'draw' }) {
  const layout = useLayout();
  const entries = useMainMenu(layout === 'phone' ? screen : null);
  if (layout === 'phone') {
    return (
      <header className="top-line no-print">
        <LazyMenu label="Menu" face="menu" className="button-icon" entries={entries} />
        <CircuitTitle most={27} />
        {screen === 'bench' && <PlayButton />}
      </header>
    );
  }
  return (
    <header className="top-line">
      <Link to="/" className="brand" aria-label="Swashbench, bench">
        <Mark size={layout === 'desk' ? 28 : 32} />
        {layout === 'desk' && <span className="wordmark">Swashbench</span>}
      </Link>
      <CircuitTitle most={layout === 'desk' ? 48 : 34} />
      <KeptWord />
      <nav className="top-nav no-print" aria-label="Screens">
        <NavLink to="/draw">Draw</NavLink>
        <NavLink to="/" end>
          Bench
        </NavLink>
      </nav>
      <LazyMenu label="Menu" className="button no-print" entries={entries} />
    </header>
  );
}

/** "kept on this device", and what to do when it is not. */
export function KeptWord() {
  const keeping = useKeeping((state) => state.keeping);
  const reason = useKeeping((state) => state.reason);
  return (
    <span className="kept" role="status" title={reason ?? undefined} data-keeping={keeping}>
      {keepingWords[keeping]}
    </span>
  );
}

function PlayButton() {
  const playing = useCursor((state) => state.playing);
  const setPlaying = useCursor((state) => state.setPlaying);
  return (
    <button type="button" className="button-icon top-play" aria-label={playing ? 'Pause' : 'Run'} onClick={() => setPlaying(!playing)}>
      <Icon name={playing ? 'pause' : 'play'} size={24} />
    </button>
  );
}
