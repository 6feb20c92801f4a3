import { groupWords, type PlacedMark } from '#shared/pictures/tape-pins.ts';
import { CaseLetter, FindingNumeral } from '#src/components/case-letter.tsx';
import { VerdictMark } from '#src/components/verdict.tsx';

export interface TapeMarksProps {
  readonly marks: readonly PlacedMark[];
  readonly rowHeight: number;
  readonly top: number;
  readonly showTime: (time: number) => string;
  readonly onPick: (time: number) => void;
  readonly onFinding?: (number: number) => void;
}

const SIZE = 16;

/** Pins of the runs and numerals of findings, between and below the flags. Clicking one moves the cursor there. They lie where
 *  their moments are, often closer than a finger is wide, so they are no buttons: the keyboard goes from one to the next by
 *  brackets and digits, and a screen reader has them all in the table. */
export function TapeMarks({ marks, rowHeight, showTime, onPick, onFinding }: TapeMarksProps) {
  return (
    <div
      className="tape-marks"
      aria-hidden="true"
      onClick={(event) => {
        const mark = (event.target as HTMLElement).closest<HTMLElement>('[data-time]');
        if (!mark) return;
        onPick(Number(mark.dataset.time));
        if (mark.dataset.number) onFinding?.(Number(mark.dataset.number));
      }}
    >
      {marks.map((mark) => {
        const pin = mark.group?.pins[0];
        const many = mark.group && mark.group.pins.length > 1 ? mark.group : null;
        const key = `${pin?.caseId ?? ''} ${pin?.kind ?? ''} ${pin?.time ?? ''} ${mark.numerals.map((entry) => entry.number).join(' ')}`;
        const top = mark.row * rowHeight;
        return (
          <div key={key} className="tape-mark" style={{ transform: `translate(${mark.x}px, ${top}px)`, height: rowHeight - 1 }}>
            {many && (
              <span
                className="tape-mark-span"
                style={{ left: many.from - mark.x, width: many.to - many.from, backgroundColor: `var(--case-${pin?.ink ?? 0})` }}
              />
            )}
            {mark.group && pin && (
              <span
                className="tape-pin"
                data-time={pin.time}
                data-side={mark.side}
                title={`${groupWords(mark.group)}, ${showTime(pin.time)}`}
                style={{ color: `var(--case-${pin.ink})` }}
              >
                <span className="tape-pin-shape">
                  {pin.verdict ? (
                    <VerdictMark verdict={pin.verdict} size={SIZE} />
                  ) : (
                    <svg width={SIZE} height={SIZE} viewBox="0 0 16 16" aria-hidden="true">
                      <path d="M8 1.5 14.5 8 8 14.5 1.5 8z" fill="var(--paper)" stroke="currentColor" strokeWidth="2" />
                    </svg>
                  )}
                </span>
              </span>
            )}
            {mark.numerals.map((numeral, k) => (
              <span
                key={numeral.number}
                className="tape-numeral"
                data-time={numeral.time}
                data-number={numeral.number}
                style={{ left: mark.group ? (many ? many.to - mark.x : 0) + SIZE / 2 + 2 + k * 20 : -9 + k * 20 }}
                title={`Finding ${numeral.number}, ${showTime(numeral.time)}`}
              >
                <FindingNumeral number={numeral.number} size={18} />
              </span>
            ))}
            {mark.words && mark.group && (
              <span
                className="tape-mark-words"
                data-side={mark.side}
                style={
                  mark.side === 'right'
                    ? { left: (many ? many.to - mark.x : 0) + SIZE / 2 + 3 + mark.numerals.length * 20 }
                    : { right: (many ? mark.x - many.from : 0) + SIZE / 2 + 3 }
                }
              >
                {mark.words}
              </span>
            )}
            {many && !mark.words && pin && <CaseLetter letter={String(many.pins.length)} ink={pin.ink} size={13} label="times" />}
          </div>
        );
      })}
    </div>
  );
}
