import { Icon } from '#src/components/icons.tsx';
import { useCursor } from '#src/stores/cursor-store.ts';

const speeds = [
  { value: 0.25, words: '¼ speed', spoken: 'a quarter' },
  { value: 1, words: '1× speed', spoken: 'full' },
  { value: 4, words: '4× speed', spoken: 'four times' },
] as const;

export interface RunControlsProps {
  /** The speed's number alone. */
  readonly compact: boolean;
  /** 'Running' or 'Paused' beside the button. */
  readonly words: boolean;
  readonly duration: number;
}

/** Run and pause, and the speed of playback. */
export function RunControls({ compact, words, duration }: RunControlsProps) {
  const playing = useCursor((state) => state.playing);
  const speed = useCursor((state) => state.speed);
  const { setPlaying, setSpeed } = useCursor.getState();
  const index = speeds.findIndex((entry) => entry.value === speed);
  const now = speeds[index] ?? speeds[1];
  const next = speeds[(index + 1) % speeds.length] ?? speeds[1];
  return (
    <div className="tape-run">
      <button
        type="button"
        className="tape-run-button"
        aria-label={playing ? 'Pause' : 'Run the tape'}
        disabled={duration <= 0}
        onClick={() => setPlaying(!playing)}
      >
        <Icon name={playing ? 'pause' : 'play'} size={18} />
      </button>
      <div className="tape-run-words">
        {words && <span>{playing ? 'Running' : 'Paused'}</span>}
        <button
          type="button"
          className="tape-speed"
          aria-label={`Speed ${now.spoken}, change to ${next.spoken}`}
          onClick={() => setSpeed(next.value)}
        >
          {compact ? now.words.replace(' speed', '') : now.words}
        </button>
      </div>
    </div>
  );
}
