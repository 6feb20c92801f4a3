import type { Component } from '../circuit/schema.ts';
import { type PlacedPort, type Point, placePort } from '../symbols/place.ts';
import { symbolOf } from '../symbols/registry.ts';
import type { Side } from '../symbols/symbol.ts';
import type { Box } from './placement.ts';

/** Where lines end and how much room they take on the sheet; in modules. */

const away: Readonly<Record<Side, Point>> = {
  left: { x: -1, y: 0 },
  right: { x: 1, y: 0 },
  top: { x: 0, y: -1 },
  bottom: { x: 0, y: 1 },
};

/** Unit step out of a side. */
export function outward(side: Side): Point {
  return away[side];
}

/** A port of a component on the sheet, or undefined where its kind or port does not exist. */
export function endOf(component: Component | undefined, portId: string): PlacedPort | undefined {
  const symbol = component ? symbolOf(component.kind) : undefined;
  return component && symbol ? placePort(symbol, component, portId) : undefined;
}

/** Parameter values as written in the document, without the case. */
export function writtenValues(component: Component): Record<string, number | string> {
  const values: Record<string, number | string> = {};
  for (const [id, entry] of Object.entries(component.parameters)) values[id] = entry.value;
  return values;
}

/** Box of a segment with some room on each side. */
export function segmentBox(a: Point, b: Point, room: number): Box {
  return {
    x: Math.min(a.x, b.x) - room,
    y: Math.min(a.y, b.y) - room,
    w: Math.abs(a.x - b.x) + 2 * room,
    h: Math.abs(a.y - b.y) + 2 * room,
  };
}
