export interface MiddleEllipsisProps {
  readonly text: string;
  /** Most characters shown; both ends matter, so the middle goes. */
  readonly most: number;
}

/** Text with its middle left out; the whole of it stays for a reader and on hover. */
export function MiddleEllipsis({ text, most }: MiddleEllipsisProps) {
  if (text.length <= most) return <span>{text}</span>;
  const head = Math.ceil((most - 1) * 0.62);
  const tail = most - 1 - head;
  return (
    <span title={text}>
      <span aria-hidden="true">{`${text.slice(0, head).trimEnd()}\u2026${text.slice(text.length - tail).trimStart()}`}</span>
      <span className="visually-hidden">{text}</span>
    </span>
  );
}
