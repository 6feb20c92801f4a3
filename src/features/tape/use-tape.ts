import { useMemo } from 'react';
import { defaultLanes, fewerLanes, type Lane } from '#shared/duty/lanes.ts';
import { channelOf } from '#shared/simulation/result.ts';
import { useFormat } from '#src/components/use-format.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useRuns } from '#src/stores/run-store.ts';
import { useShownDocument } from '#src/stores/shown-document.ts';
import { useLaneChoice } from './lane-store.ts';
import { type TapeModel, tapeCases, tapeModel } from './tape-model.ts';

/** The tape's model from the stores: it changes with document, runs, case choice, units and lane choice, never with the cursor. */
export function useTape(room: number): TapeModel {
  const document = useShownDocument();
  const activeCase = useDocument((state) => state.activeCase);
  const overlays = useDocument((state) => state.overlays);
  const byCase = useRuns((state) => state.byCase);
  const chosen = useLaneChoice((state) => state.chosen);
  const { preferences } = useFormat();
  const cases = useMemo(() => tapeCases(document, activeCase, overlays, byCase), [document, activeCase, overlays, byCase]);
  return useMemo(() => {
    const run = cases.find((entry) => entry.active)?.run ?? cases.find((entry) => entry.run)?.run ?? null;
    const lanes = chosenLanes(chosen, run ? (address) => channelOf(run, address) : () => undefined) ?? defaultLanes(document);
    return tapeModel(document, cases, byCase, fewerLanes(lanes, room), preferences);
  }, [document, cases, byCase, chosen, room, preferences]);
}

function chosenLanes(chosen: readonly string[] | null, find: (address: string) => ReturnType<typeof channelOf>): Lane[] | null {
  if (!chosen) return null;
  const lanes = chosen.flatMap((address): Lane[] => {
    const channel = find(address);
    if (!channel) return [];
    const role = address.endsWith('.torqueRatio') ? { role: 'load' as const } : {};
    return [{ address, title: channel.label, quantity: channel.quantity, ...role }];
  });
  return lanes.length > 0 ? lanes : null;
}
