import type { NodeProps, NodeTypes } from 'reactflow';
import { tagSizes } from './bench-layout.ts';
import { Reading } from './reading.tsx';
import type { ReadingSpec } from './reading-specs.ts';
import { SheetView, type SheetViewProps } from './sheet-view.tsx';
import { Tag, type TagProps } from './tag.tsx';
import { TagStrings, type TagStringsProps } from './tag-strings.tsx';

/** What lies on the sheet, from the bottom: the circuit, strings, readings, tags. */

function SheetNode({ data }: NodeProps<SheetViewProps>) {
  return <SheetView {...data} />;
}

function StringsNode({ data }: NodeProps<TagStringsProps>) {
  return <TagStrings {...data} />;
}

function ReadingNode({ data }: NodeProps<{ readonly spec: ReadingSpec; readonly grow: number }>) {
  return (
    <div className="bench-scaled" style={{ transform: `scale(${data.grow})`, width: data.spec.width, height: data.spec.height }}>
      <Reading spec={data.spec} />
    </div>
  );
}

export interface TagNodeData extends TagProps {
  readonly grow: number;
  readonly chipText: string;
}

function TagNode({ data }: NodeProps<TagNodeData>) {
  const { grow, chipText, ...tag } = data;
  const { width, height } = tagSizes(tag.touch, chipText)[tag.form];
  return (
    <div className="bench-scaled" style={{ transform: `scale(${grow})`, width, height }}>
      <Tag {...tag} />
    </div>
  );
}

export const benchNodeTypes: NodeTypes = { sheet: SheetNode, strings: StringsNode, reading: ReadingNode, tag: TagNode };
