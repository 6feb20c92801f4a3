import { createContext, type ReactNode, useContext, useEffect, useState } from 'react';
import { useKeeping } from '#src/stores/keeping-store.ts';

/** Regions of a screen come one after the other, each in a task of its own, once the circuit is in hand: the page can be used, and drawn,
 *  between them. */

/** A device whose storage does not answer shows an empty bench after this [ms]. */
const PATIENCE = 1500;

const Stage = createContext(0);

export function Stages({ count, children }: { readonly count: number; readonly children: ReactNode }) {
  const loading = useKeeping((state) => state.keeping === 'loading');
  const [patient, setPatient] = useState(true);
  const [stage, setStage] = useState(0);
  const opening = loading && patient;
  useEffect(() => {
    const timer = setTimeout(() => setPatient(false), PATIENCE);
    return () => clearTimeout(timer);
  }, []);
  useEffect(() => {
    if (opening || stage >= count) return;
    const timer = setTimeout(() => setStage(stage + 1));
    return () => clearTimeout(timer);
  }, [opening, stage, count]);
  return <Stage.Provider value={stage}>{children}</Stage.Provider>;
}

/** Shown from its stage on, 1 being the first. */
export function Staged({ at, children }: { readonly at: number; readonly children: ReactNode }) {
  return useContext(Stage) >= at ? children : null;
}
