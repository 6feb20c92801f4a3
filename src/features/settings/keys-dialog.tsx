import { SheetDialog } from '#src/components/dialog.tsx';
import { useFormat } from '#src/components/use-format.ts';

const groups = [
  {
    title: 'On the drawing or the tape',
    keys: [
      ['Space', 'run, pause'],
      ['\u2190 \u2192', 'cursor 10 ms, with Shift 100 ms'],
      ['[ ]', 'event before, event after'],
      ['1 \u2013 9', 'the moment of that finding'],
      [', .', 'case before, case after, on the drawing'],
      ['O', 'overlay the former case'],
      ['N', 'new case'],
      ['?', 'this list'],
    ],
  },
  {
    title: 'On a screw tag',
    keys: [
      ['Tab', 'the next tag, in flow order'],
      ['\u2191 \u2193', 'a quarter turn, with Shift fine'],
      ['Home', 'as found'],
      ['L', 'lock nut'],
      ['Enter', 'nameplate'],
    ],
  },
  {
    title: 'On the Draw stage',
    keys: [
      ['Enter', 'on a ring: what may follow'],
      ['R', 'turn'],
      ['X', 'mirror'],
      ['D', 'duplicate'],
      ['Delete', 'delete, naming what goes with it'],
    ],
  },
  {
    title: 'Everywhere',
    keys: [
      ['Ctrl Z', 'undo'],
      ['Ctrl Y, Ctrl Shift Z', 'redo'],
      ['F2', 'on a case card: rename'],
      ['Esc', 'close, let go'],
    ],
  },
] as const;

/** Letters and digits act only while the drawing or the tape has the focus, never from a field. */
export function KeysDialog({ onClose }: { readonly onClose: () => void }) {
  const { words } = useFormat();
  return (
    <SheetDialog title="Key list" onClose={onClose}>
      <p>Letters and digits act only while the drawing or the tape has the focus, never from a field.</p>
      {groups.map((group) => (
        <section key={group.title}>
          <h3 className="region-heading">{group.title}</h3>
          <table className="table">
            <tbody>
              {group.keys.map(([key, does]) => (
                <tr key={key}>
                  <th scope="row" className="key-name">
                    <kbd className="reading">{key}</kbd>
                  </th>
                  <td>{words(does)}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </section>
      ))}
    </SheetDialog>
  );
}
