import { beforeEach, describe, expect, it } from 'vitest';
import { addCase, deleteCase } from '#shared/circuit/edit/cases.ts';
import { moveParts } from '#shared/circuit/edit/components.ts';
import { removeItems } from '#shared/circuit/edit/removal.ts';
import { builtPress } from '#shared/circuit/edit/test-circuits.ts';
import { useDocument } from './document-store.ts';

const store = () => useDocument.getState();
const nudge = () => store().edit((document) => moveParts(document, ['v1'], { x: 1, y: 0 }));

beforeEach(() => store().load(builtPress()));

describe('the circuit in hand', () => {
  it('makes each edit one step, and everything in a gesture one step', () => {
    const start = store().document;
    nudge();
    store().beginGesture();
    nudge();
    nudge();
    store().endGesture();
    expect(store().past).toHaveLength(2);
    store().undo();
    store().undo();
    expect(store().document).toBe(start);
    store().redo();
    store().redo();
    expect(store().future).toEqual([]);
    expect(store().document.components.find((part) => part.id === 'v1')?.at.x).toBe(43);
  });

  it('undoes a gesture in progress back to where it began', () => {
    const start = store().document;
    nudge();
    const before = store().document;
    store().beginGesture();
    nudge();
    store().undo();
    expect(store().document).toBe(before);
    expect(store().gesture).toBeNull();
    store().undo();
    expect(store().document).toBe(start);
  });

  it('keeps no step for an edit that changed nothing', () => {
    store().edit((document) => document);
    expect(store().past).toEqual([]);
  });

  it('lets go of what is no longer there: selection, tag in hand, case on the drawing', () => {
    const made = addCase(store().document, 'a');
    store().edit(() => made.document);
    store().setActiveCase(made.caseId as string);
    store().select(['p1', 'a1']);
    store().takeInHand('p1.maxVolumeStop');
    store().edit((document) => deleteCase(removeItems(document, ['p1']), made.caseId as string));
    expect(store()).toMatchObject({ selection: ['a1'], inHand: null, activeCase: 'a' });
  });
});
