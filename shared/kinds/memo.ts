import type { Block, Workspace } from './kind.ts';

/** For which instance and pass a kind's shared working point was filled last, so that the several readings, signals and powers
 *  of one instance at one instant work it out once. Keeps nothing for workspaces without a pass number. */
export class Memo {
  private block: Block | null = null;
  private workspace: Workspace | null = null;
  private instance = -1;
  private pass = -1;

  /** True when the point still holds for this instance and pass; otherwise notes that it is about to be filled for them. */
  holds(block: Block, i: number, w: Workspace): boolean {
    const { pass } = w;
    if (pass === undefined) {
      this.block = null;
      return false;
    }
    if (this.pass === pass && this.instance === i && this.block === block && this.workspace === w) return true;
    this.pass = pass;
    this.instance = i;
    this.block = block;
    this.workspace = w;
    return false;
  }
}
