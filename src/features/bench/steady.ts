import type { Node } from 'reactflow';

/** Keeping objects the same while their content is: what did not change is not drawn again. */

/** The former object when it says the same as the new one. Contents are plain data. */
export function sameContent<T>(before: T | undefined, next: T): T {
  return before !== undefined && JSON.stringify(before) === JSON.stringify(next) ? before : next;
}

function shallowEqual(a: Readonly<Record<string, unknown>>, b: Readonly<Record<string, unknown>>): boolean {
  const keys = Object.keys(a);
  return keys.length === Object.keys(b).length && keys.every((key) => Object.is(a[key], b[key]));
}

/** The former nodes where nothing about them changed. */
export function steadyNodes(before: ReadonlyMap<string, Node>, next: readonly Node[]): Node[] {
  return next.map((node) => {
    const old = before.get(node.id);
    if (!old || old.zIndex !== node.zIndex || old.position.x !== node.position.x || old.position.y !== node.position.y) return node;
    return shallowEqual(old.data, node.data) ? old : node;
  });
}
