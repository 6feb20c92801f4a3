import type { ConnectionLineComponentProps } from 'reactflow';

/** The line being drawn: dotted until it is let go. */
export function JoiningLine({ fromX, fromY, toX, toY }: ConnectionLineComponentProps) {
  const upright = Math.abs(toY - fromY) > Math.abs(toX - fromX);
  const d = upright ? `M${fromX} ${fromY}V${toY}H${toX}` : `M${fromX} ${fromY}H${toX}V${toY}`;
  return <path d={d} className="joining-line" />;
}
