import { useMemo, useRef } from 'react';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { type RoutedLine, routeLines, routeSignature } from '#shared/pictures/route.ts';
import { joinedPorts } from '#shared/pictures/schematic-shapes.ts';

/** Routes of a document's lines, laid anew only when something on the sheet moved. */
export function useRoutes(document: CircuitDocument): ReadonlyMap<string, RoutedLine> {
  const signature = useMemo(() => routeSignature(document), [document]);
  const kept = useRef<{ signature: string; routes: ReadonlyMap<string, RoutedLine> } | null>(null);
  return useMemo(() => {
    if (kept.current?.signature !== signature) kept.current = { signature, routes: routeLines(document) };
    return kept.current.routes;
  }, [signature, document]);
}

const none: ReadonlySet<string> = new Set();

/** Joined ports by component, with steady sets while the lines stay the same. */
export function useJoinedPorts(document: CircuitDocument): (componentId: string) => ReadonlySet<string> {
  const { lines } = document;
  return useMemo(() => {
    const joined = joinedPorts({ lines });
    return (componentId: string) => joined.get(componentId) ?? none;
  }, [lines]);
}
