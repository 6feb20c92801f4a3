import { useEffect } from 'react';
import { narrowReadings, narrowTags } from '#shared/circuit/samples/demo-narrow.ts';
import { useDocument } from '#src/stores/document-store.ts';

/** Lays the screw down: the list of parts takes the wheel's place. */
export const layDown = () => useDocument.getState().takeInHand(null);
export const narrowContent = { tags: narrowTags, readings: narrowReadings };

/** The narrow demo opens with its max. volume stop in hand, so that the wheel is there to be turned. */
export function useFirstInHand(narrow: boolean) {
  useEffect(() => {
    const { inHand, takeInHand } = useDocument.getState();
    if (narrow && inHand === null) takeInHand('P1.maxVolumeStop');
  }, [narrow]);
}
