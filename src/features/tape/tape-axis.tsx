import { tickDigits } from '#shared/pictures/scale.ts';
import { useFormat } from '#src/components/use-format.ts';
import { TapePlate } from './tape-cursor.tsx';
import { type TapeGeometry, timeScale } from './tape-geometry.ts';
import type { TapeModel } from './tape-model.ts';

export interface TapeAxisProps {
  readonly model: TapeModel;
  readonly geometry: TapeGeometry;
}

/** Time axis with the cursor's plate and, while a run goes on, how far it has come. */
export function TapeAxis({ model, geometry }: TapeAxisProps) {
  const format = useFormat();
  const x = timeScale(geometry);
  const ticks = x.ticks(Math.max(3, Math.round(geometry.plotWidth / 90)));
  const digits = tickDigits(ticks);
  const last = ticks[ticks.length - 1];
  const running = model.cases.find((entry) => entry.running && entry.reached > 0 && entry.reached < model.duration);
  return (
    <div className="tape-axis">
      {running && (
        <div className="tape-feed" style={{ width: x(running.reached) }}>
          <span>
            {running.pen.letter} {format.number(running.reached, 1)} of {format.number(model.duration, digits)}
            {'\u202f'}s
          </span>
        </div>
      )}
      <div aria-hidden="true">
        {ticks.map((tick) => (
          <span key={tick} className="tape-tick" style={{ transform: `translateX(${x(tick)}px)` }}>
            <span>
              {format.number(tick, digits)}
              {tick === last ? '\u202fs' : ''}
            </span>
          </span>
        ))}
      </div>
      <TapePlate geometry={geometry} />
    </div>
  );
}
