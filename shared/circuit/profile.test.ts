import { describe, expect, it } from 'vitest';
import { breakpoints, movedProfile, profileOf, profileValue } from './profile.ts';

describe('input profiles', () => {
  it('rest until a move, ramp, and stay', () => {
    const profile = profileOf(2, [{ time: 1, ramp: 0.5, value: 4 }]);
    expect([0, 1, 1.25, 1.5, 9].map((t) => profileValue(profile, t))).toEqual([2, 2, 3, 4, 4]);
  });

  it('jump with a ramp of 0 and take the later of two moves at one time', () => {
    const profile = profileOf(0, [
      { time: 1, ramp: 0, value: 1 },
      { time: 1, ramp: 0, value: 5 },
    ]);
    expect(profileValue(profile, 0.999)).toBe(0);
    expect(profileValue(profile, 1)).toBe(5);
  });

  it('start from the value reached when a move comes in the middle of a ramp', () => {
    const profile = profileOf(0, [
      { time: 0, ramp: 1, value: 10 },
      { time: 0.5, ramp: 1, value: 0 },
    ]);
    expect(profileValue(profile, 0.5)).toBe(5);
    expect(profileValue(profile, 1)).toBe(2.5);
    expect(profileValue(profile, 2)).toBe(0);
  });

  it('take moves in order of time however they are listed', () => {
    const moves = [
      { time: 2, ramp: 0, value: 7 },
      { time: 1, ramp: 0, value: 3 },
    ];
    expect(profileValue(profileOf(0, moves), 1.5)).toBe(3);
    expect(profileValue(profileOf(0, moves), 2.5)).toBe(7);
  });

  it('lose what comes after an override', () => {
    const profile = movedProfile(profileOf(0, [{ time: 1, ramp: 0, value: 1 }]), { time: 0.5, ramp: 0, value: -1 });
    expect(profileValue(profile, 0.4)).toBe(0);
    expect(profileValue(profile, 3)).toBe(-1);
  });

  it('give every corner once, within the run', () => {
    const a = profileOf(0, [{ time: 1, ramp: 0.5, value: 1 }]);
    const b = profileOf(0, [
      { time: 1, ramp: 0, value: 1 },
      { time: 7, ramp: 0, value: 1 },
    ]);
    expect(breakpoints([a, b], 4)).toEqual([0, 1, 1.5, 4]);
  });
});
