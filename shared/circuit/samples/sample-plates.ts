import type { ParameterValue } from '../schema.ts';
import {
  amps,
  bar,
  barPerTurn,
  choice,
  cubic,
  cubicPerTurn,
  hertz,
  kilowatts,
  litres,
  milliseconds,
  percent,
  ratio,
  rpm,
  volts,
} from './sample-builder.ts';

/** Nameplates that several samples share: 4-pole 400 V 50 Hz motor, compensated pump, relief, directional valve. */

export function motor(power: number, current: number): Record<string, ParameterValue> {
  return {
    ratedPower: kilowatts(power),
    ratedVoltage: volts(400),
    ratedFrequency: hertz(50),
    poles: choice('4'),
    ratedSpeed: rpm(1450),
    ratedCurrent: amps(current),
    lockedRotorCurrent: ratio(6),
    contactorAtStart: choice('open'),
    designLetter: choice('N minima'),
    serviceFactor: ratio(1),
    relayFitted: choice('yes'),
    relayDial: amps(current),
    relayClass: choice('10'),
    relayStandard: choice('IEC'),
  };
}

export function pump(displacement: number, stop: number, compensator: number): Record<string, ParameterValue> {
  return {
    displacement: cubic(displacement),
    compensatorPressure: bar(compensator),
    maxVolumeStop: cubic(stop),
    minVolumeStop: cubic(0),
    leastCompensator: bar(20),
    mostCompensator: bar(280),
    leastStop: cubic(displacement / 4),
    mostStop: cubic(displacement),
    leastMinStop: cubic(0),
    mostMinStop: cubic(displacement / 4),
    compensatorPerTurn: barPerTurn(20),
    stopPerTurn: cubicPerTurn(4),
    minStopPerTurn: cubicPerTurn(4),
    band: bar(8),
    destrokeLag: milliseconds(12),
    onstrokeLag: milliseconds(30),
    ratedPressure: bar(280),
  };
}

export function relief(type: 'direct' | 'pilot', set: number, flow: number): Record<string, ParameterValue> {
  return {
    type: choice(type),
    setPressure: bar(set),
    leastSet: bar(20),
    mostSet: bar(315),
    setPerTurn: barPerTurn(40),
    setFlow: litres(flow),
    override: percent(type === 'pilot' ? 6 : 20),
    ratedPressure: bar(315),
  };
}

export function valve(centre: 'closed' | 'open' | 'tandem' | 'float'): Record<string, ParameterValue> {
  return {
    centre: choice(centre),
    ratedFlow: litres(60),
    ratedDrop: bar(5),
    ratedPressure: bar(315),
  };
}

export const PUMP_SCREWS = {
  screws: ['compensatorPressure', 'maxVolumeStop', 'minVolumeStop'],
  locked: ['minVolumeStop'],
} as const;
export const RELIEF_SCREW = {
  screws: ['setPressure'],
  locked: ['setPressure'],
} as const;
